"use client";

import { useInfiniteQuery, useMutation, useQueryClient } from "@tanstack/react-query";
import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";
import { noticeWords } from "@/components/notices/notice-words";
import { Button } from "@/components/ui/button";
import { minuteOf } from "@/components/ui/minute";
import { StateMark, StateNote } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";
import type { NoticeItem, NoticePage, Reading, Unread } from "@/lib/notices/schema";

interface Props {
  first: NoticePage;
  /** stands at the end of the head: where else to look */
  aside?: ReactNode;
}

function useNotices(first: NoticePage) {
  return useInfiniteQuery({
    queryKey: ["notices", "list"],
    queryFn: ({ pageParam, signal }) =>
      call<NoticePage>(pageParam === "" ? "/notices" : `/notices?cursor=${pageParam}`, { signal }),
    initialPageParam: "",
    getNextPageParam: (page) => page.nextCursor,
    initialData: { pages: [first], pageParams: [""] },
    refetchOnMount: "always",
  });
}

/** Marks notices as read, here and in the bar. */
function useReading() {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (body: Reading) => call<Unread>("/notices/read", { method: "POST", body }),
    onSuccess: (left) => {
      queries.setQueryData(["notices", "unread"], left);
      return queries.invalidateQueries({ queryKey: ["notices", "list"] });
    },
  });
}

/** What one has been told, the latest first. Opening what a notice is about marks it as read. */
export function NoticeList({ first, aside }: Props) {
  const pages = useNotices(first);
  const reading = useReading();
  const notices = pages.data.pages.flatMap(({ items }) => items);
  const unread = pages.data.pages[0]?.unread ?? 0;
  const [latest] = notices;
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <h1 className="phone:sr-only">Notices</h1>
        <p role="status" className="text-label text-ink-2">
          {notices.length > 0 && (unread > 0 ? `${unread} not read yet` : "All read")}
        </p>
        {latest && (
          <Button
            size="small"
            onClick={() => reading.mutate({ all: true, upTo: latest.at })}
            refused={unread === 0 ? "Every notice has been read." : reading.isPending && "It is on its way."}
          >
            Mark all as read
          </Button>
        )}
        <div className="ml-auto text-label">{aside}</div>
      </div>
      {pages.error && <StateNote state="warn">The list may be old: {pages.error.message}</StateNote>}
      {reading.error && <StateNote state="fail">Not marked as read: {reading.error.message}</StateNote>}
      {notices.length === 0 ? (
        <NoNotices />
      ) : (
        <Notices notices={notices} read={(id) => reading.mutate({ ids: [id] })} />
      )}
      {pages.hasNextPage && (
        <Button
          className="mt-4"
          onClick={() => void pages.fetchNextPage()}
          refused={pages.isFetchingNextPage && "The next notices are on their way."}
        >
          Show more
        </Button>
      )}
    </>
  );
}

function Notices({ notices, read }: { notices: NoticeItem[]; read: (id: string) => void }) {
  return (
    <ul className="mt-3 border-t border-rule">
      {notices.map((notice) => (
        <NoticeRow key={notice.id} notice={notice} read={() => read(notice.id)} />
      ))}
    </ul>
  );
}

function NoticeRow({ notice, read }: { notice: NoticeItem; read: () => void }) {
  const { at, kind, text, link, isRead } = notice;
  const { mark, word } = noticeWords[kind];
  return (
    <li
      className={`grid grid-cols-[9rem_1fr_auto] items-baseline gap-x-4 border-b border-line py-2 phone:grid-cols-[1fr_auto] ${isRead ? "" : "shadow-[inset_3px_0_0_var(--copper)]"}`}
    >
      <StateMark state={mark} className="pl-3">
        {word}
      </StateMark>
      <Link
        href={link as Route}
        onClick={() => !isRead && read()}
        className={`min-w-0 text-row break-words hover:text-copper phone:col-span-2 phone:row-start-2 phone:min-h-11 phone:py-2 phone:pl-3 ${isRead ? "text-ink-2" : "font-[560] text-ink"}`}
      >
        {!isRead && <span className="sr-only">Not read yet: </span>}
        {text}
      </Link>
      <time dateTime={at} className="figures text-note whitespace-nowrap text-ink-3">
        {minuteOf(at)}
      </time>
    </li>
  );
}

function NoNotices() {
  return (
    <p className="mt-8 max-w-140 text-row">
      Nothing to tell you yet. When an entry of yours is reviewed, or a cable in one of your runs is restricted,
      quarantined or superseded, you read it here.
    </p>
  );
}
