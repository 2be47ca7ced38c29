"use client";

import type { Route } from "next";
import Link from "next/link";
import { HoldHere } from "@/components/cables/hold-here";
import type { ChangeLook } from "@/components/cables/use-entry-address";
import { buildWords, familyWords, stateWords } from "@/components/cables/words";
import { Button, ButtonLink } from "@/components/ui/button";
import { StateMark, StateNote } from "@/components/ui/state-mark";
import { catalogueAddress, readCatalogueAddress } from "@/lib/cables/address";
import { compareFigures, differencePercent, type CompareFigures } from "@/lib/cables/compare";
import { entryAddress, type EntryAsked } from "@/lib/cables/entry-address";
import { isUsable } from "@/lib/cables/model";
import type { Cable, CableState } from "@/lib/cables/schema";
import { digits, frequency, inWords } from "@/lib/format/quantity";

export interface EntryHeadProps {
  cable: Cable;
  /** the entry that takes its place, where the reader may see it */
  successor: Cable | null;
  asked: EntryAsked;
  change: ChangeLook;
  canStartRun: boolean;
  /** what leads to the editor; null where the reader can neither edit a draft nor begin one */
  edit: string | null;
}

const refusals: Record<Exclude<CableState, "approved" | "restricted">, string> = {
  draft: "A draft does not go into a run: it has not been approved.",
  inReview: "It is still in review; only approved cables go into a run.",
  quarantined: "It is quarantined and must not be used anew.",
  superseded: "It is superseded; use its successor.",
  withdrawn: "It is withdrawn and must not be used anew.",
};

/** The catalogue with what is held up. */
function catalogueWith({ lossAtHz, held }: EntryAsked, family?: Cable["family"]): Route {
  const families = family ? [family] : [];
  return catalogueAddress({ ...readCatalogueAddress({}), lossAtHz, held, families }) as Route;
}

export function EntryHead(props: EntryHeadProps) {
  const { cable, asked, change, canStartRun, edit } = props;
  const { designation, family, name, build, state, revision, preferred, aliases } = cable;
  const { word, mark } = stateWords[state];
  const refusal = isUsable(state) ? false : refusals[state as keyof typeof refusals];
  const run = `/runs/new?cable=${encodeURIComponent(cable.id)}` as Route;
  return (
    <>
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <p className="text-label text-ink-2 phone:hidden">
            <Link href={catalogueWith(asked)} className="hover:text-copper">
              Catalogue
            </Link>
            {" / "}
            <Link href={catalogueWith(asked, family)} className="hover:text-copper">
              {familyWords[family]}
            </Link>
          </p>
          <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
            <h1 className="break-words phone:sr-only">{designation}</h1>
            <p className="text-ink-2">
              {name}. {buildWords(build)}
            </p>
            <StateMark state={mark}>
              {word}, revision {revision}
            </StateMark>
          </div>
          {(preferred || aliases.length > 0) && (
            <p className="text-label text-ink-3">
              {preferred && <span className="text-copper">Preferred. </span>}
              {aliases.length > 0 && <>Also called {aliases.join(", ")}.</>}
            </p>
          )}
        </div>
        <div className="flex flex-wrap items-center gap-2.5">
          <HoldHere cable={cable} asked={asked} change={change} />
          {edit && <ButtonLink href={`/cables/${encodeURIComponent(cable.id)}/edit` as Route}>{edit}</ButtonLink>}
          {canStartRun &&
            (refusal ? (
              <Button refused={refusal}>Use in a run</Button>
            ) : (
              <ButtonLink href={run} kind="main">
                Use in a run
              </ButtonLink>
            ))}
        </div>
      </div>
      <Standing {...props} />
    </>
  );
}

const equivalenceWords = {
  dropIn: "a drop-in replacement",
  electricallyEqual: "electrically equal",
  needsRedesign: "runs need a redesign",
} as const;

/** What stands in the way of using an entry, or on which terms it may be used. */
function Standing({ cable, successor, asked }: EntryHeadProps) {
  const { state, condition } = cable;
  if (state === "approved") return null;
  return (
    <div className="mt-2.5 max-w-200">
      {state === "restricted" && (
        <StateNote state="warn">Restricted: {condition ?? "ask a librarian before use."}</StateNote>
      )}
      {(state === "quarantined" || state === "withdrawn") && (
        <StateNote state="fail">
          {refusals[state]} Runs that use it already stay readable.{condition && ` ${condition}`}
        </StateNote>
      )}
      {(state === "draft" || state === "inReview") && (
        <StateNote state={stateWords[state].mark}>Nobody has approved these figures yet.</StateNote>
      )}
      {cable.successor && (
        <StateNote state="warn">
          Superseded by{" "}
          <Link href={entryAddress(cable.successor.cableId, asked) as Route} className="link">
            {cable.successor.designation}
          </Link>
          : {equivalenceWords[cable.successor.equivalence]}.
          {successor && <Differences from={cable} to={successor} lossAtHz={asked.lossAtHz} />}
        </StateNote>
      )}
      {state === "superseded" && !cable.successor && (
        <StateNote state="warn">Superseded; no successor is named.</StateNote>
      )}
    </div>
  );
}

const told: { quantity: keyof CompareFigures; name: (at: string) => string; decimals: number }[] = [
  { quantity: "z0Ohm", name: () => "impedance", decimals: 1 },
  { quantity: "velocityFactor", name: () => "velocity factor", decimals: 3 },
  { quantity: "lossDbPer100m", name: (at) => `dB/100 m at ${at}`, decimals: 2 },
  { quantity: "outerDiameterMm", name: () => "mm across", decimals: 1 },
  { quantity: "minBendMm", name: () => "mm bend radius", decimals: 0 },
];

/** Less than this says nothing, per cent. */
const least = 0.5;

/** What changes where one cable is put in the place of another. */
function Differences({ from, to, lossAtHz }: { from: Cable; to: Cable; lossAtHz: number }) {
  const [before, after] = [compareFigures(from, lossAtHz), compareFigures(to, lossAtHz)];
  const at = inWords(frequency(lossAtHz));
  const changes = told.flatMap(({ quantity, name, decimals }) => {
    const percent = differencePercent(after[quantity], before[quantity]);
    if (percent === null || Math.abs(percent) < least) return [];
    return [`${name(at)} ${digits(before[quantity], decimals)} → ${digits(after[quantity], decimals)}`];
  });
  if (changes.length === 0) return <> Its figures are the same within half a per cent.</>;
  return <> What changes: {changes.join("; ")}.</>;
}
