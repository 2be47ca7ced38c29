"use client";

import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import { minuteOf } from "@/components/ui/minute";
import { Button } from "@/components/ui/button";
import { Select } from "@/components/ui/select";
import { StateMark, StateNote, type MarkedState } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";
import type { LetterItem, LetterPage, LetterState } from "@/lib/mail/schema";

const stateWords: Record<LetterState, { mark: MarkedState; word: string }> = {
  waiting: { mark: "none", word: "Waiting" },
  sent: { mark: "pass", word: "Sent" },
  givenUp: { mark: "fail", word: "Given up" },
};

function address(state: LetterState | "", cursor: string): string {
  const parameters = new URLSearchParams();
  if (state) parameters.set("state", state);
  if (cursor) parameters.set("cursor", cursor);
  return parameters.size > 0 ? `/team/letters?${parameters}` : "/team/letters";
}

function useLetters(first: LetterPage, state: LetterState | "") {
  return useInfiniteQuery({
    queryKey: ["letters", state],
    queryFn: ({ pageParam, signal }) => call<LetterPage>(address(state, pageParam), { signal }),
    initialPageParam: "",
    getNextPageParam: (page) => page.nextCursor,
    initialData: state === "" ? { pages: [first], pageParams: [""] } : undefined,
    placeholderData: (before) => before,
    refetchOnMount: "always",
  });
}

/** The letters the team's people were written, the latest first, each with what became of it. */
export function LetterList({ first }: { first: LetterPage }) {
  const [state, setState] = useState<LetterState | "">("");
  const pages = useLetters(first, state);
  const letters = pages.data?.pages.flatMap(({ items }) => items) ?? [];
  const total = pages.data?.pages[0]?.total;
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <h1 className="phone:sr-only">Letters</h1>
        <Select
          label="State"
          isLabelHidden
          value={state}
          onChange={(event) => setState(event.target.value as LetterState | "")}
          className="w-36"
        >
          <option value="">Every state</option>
          {Object.entries(stateWords).map(([value, { word }]) => (
            <option key={value} value={value}>
              {word}
            </option>
          ))}
        </Select>
        <p role="status" className="text-label text-ink-2">
          {total !== undefined && (total === 1 ? "1 letter" : `${total} letters`)}
        </p>
      </div>
      {!first.hasMailServer && (
        <StateNote state="warn" className="mt-3">
          No mail server is set, so letters are not sent: they stay here to be read. The README says how to set one.
        </StateNote>
      )}
      {pages.error && <StateNote state="warn">The list may be old: {pages.error.message}</StateNote>}
      {total === 0 && <p className="mt-8 text-row">{state === "" ? "No letter has been written yet." : "None."}</p>}
      {letters.length > 0 && (
        <ul className="mt-3 border-t border-rule">
          {letters.map((letter) => (
            <Letter key={letter.id} letter={letter} />
          ))}
        </ul>
      )}
      {pages.hasNextPage && (
        <Button
          className="mt-4"
          onClick={() => void pages.fetchNextPage()}
          refused={pages.isFetchingNextPage && "The next letters are on their way."}
        >
          Show more
        </Button>
      )}
    </>
  );
}

/** When it was sent, or how often it was tried and when again. */
function fate({ state, tries, nextTryAt, sentAt }: LetterItem): string {
  if (sentAt !== null) return `sent ${minuteOf(sentAt)}`;
  const tried = tries === 0 ? "not tried yet" : `tried ${tries === 1 ? "once" : `${tries} times`}`;
  return state === "waiting" && nextTryAt !== null ? `${tried}, next ${minuteOf(nextTryAt)}` : tried;
}

function Letter({ letter }: { letter: LetterItem }) {
  const { toAddress, subject, body, writtenAt, state, error } = letter;
  const { mark, word } = stateWords[state];
  return (
    <li className="border-b border-line">
      <details>
        <summary className="grid cursor-pointer grid-cols-[7rem_1fr_auto] items-baseline gap-x-4 py-2 phone:min-h-11 phone:grid-cols-[1fr_auto]">
          <StateMark state={mark}>{word}</StateMark>
          <span className="min-w-0 text-row break-words phone:col-span-2 phone:row-start-2">
            {subject} <span className="text-label text-ink-2">to {toAddress}</span>
          </span>
          <time dateTime={writtenAt} className="figures text-note whitespace-nowrap text-ink-3">
            {minuteOf(writtenAt)}
          </time>
        </summary>
        <div className="pb-3 pl-29 phone:pl-0">
          <p className="text-label text-ink-2">{fate(letter)}</p>
          {error && <StateNote state={state === "givenUp" ? "fail" : "warn"}>The mail server said: {error}</StateNote>}
          <p className="mt-2 border-l-2 border-rule pl-3 text-body break-words whitespace-pre-wrap">{body}</p>
        </div>
      </details>
    </li>
  );
}
