"use client";

import { useState } from "react";
import { fieldWords, valueClass } from "@/components/review/field-words";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { fieldsOfBoth, type Difference } from "@/lib/cables/revisions/differences";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { digits } from "@/lib/format/quantity";

interface Props {
  before: CableRevision;
  after: CableRevision;
  lossAtHz: number;
}

type Field = Difference & { isSame: boolean };

const signed = (percent: number) => `${percent > 0 ? "+" : ""}${digits(percent, 1)} %`;

/** One field: what it was, struck, and what it is, washed. */
function Row({ field, lossAtHz }: { field: Field; lossAtHz: number }) {
  const { name, before, after, unit } = fieldWords(field, lossAtHz);
  return (
    <tr>
      <RowHead>{name}</RowHead>
      <Cell isRight className={valueClass(field.before)}>
        {field.isSame ? (
          before
        ) : (
          <s className="text-ink-3">
            <span className="sr-only">was </span>
            {before}
          </s>
        )}
      </Cell>
      <Cell isRight className={valueClass(field.after)}>
        {field.isSame ? (
          after
        ) : (
          <b className="bg-copper-wash px-1.5 py-0.5 font-[650]">
            <span className="sr-only">is now </span>
            {after}
          </b>
        )}
      </Cell>
      <Cell className="unit pl-2 whitespace-nowrap">{unit}</Cell>
      <Cell isRight className="figures whitespace-nowrap">
        {field.isSame || field.percent === null ? "" : signed(field.percent)}
      </Cell>
      <Cell className="pl-4 text-ink-2 phone:hidden">{field.isSame ? "" : field.source}</Cell>
    </tr>
  );
}

/** Every field that changed, given ones first and then what follows from them; the others on request. */
export function ChangedFields({ before, after, lossAtHz }: Props) {
  const [isWhole, setWhole] = useState(false);
  const isDerived = ({ isGiven, field }: Field) =>
    !isGiven || field.startsWith("model.") || /^figure\..+\.derived\b/.test(field);
  // What is worked out moves in digits that nobody sees; it has changed where its printed value has.
  const isAlike = (field: Field) => {
    const words = fieldWords(field, lossAtHz);
    return field.isSame || (isDerived(field) && words.before === words.after);
  };
  const all = fieldsOfBoth(before, after, lossAtHz).map((field) => ({ ...field, isSame: isAlike(field) }));
  const shown = isWhole ? all : all.filter(({ isSame }) => !isSame);
  const [given, derived] = [shown.filter((field) => !isDerived(field)), shown.filter(isDerived)];
  const same = all.filter(({ isSame }) => isSame).length;
  const rows = (fields: readonly Field[]) =>
    fields.map((each) => <Row key={each.field} field={each} lossAtHz={lossAtHz} />);
  return (
    <div className="overflow-x-auto">
      <Table>
        <thead>
          <tr>
            <HeadCell>Given</HeadCell>
            <HeadCell isRight>Revision {before.revision}</HeadCell>
            <HeadCell isRight>Revision {after.revision}</HeadCell>
            <HeadCell aria-label="Unit" />
            <HeadCell isRight>Change</HeadCell>
            <HeadCell className="pl-4 phone:hidden">Source</HeadCell>
          </tr>
        </thead>
        <tbody>
          {given.length === 0 && (
            <tr>
              <Cell colSpan={6}>Nothing that is given has changed.</Cell>
            </tr>
          )}
          {rows(given)}
        </tbody>
        {derived.length > 0 && (
          <tbody>
            <tr>
              <th
                colSpan={6}
                scope="rowgroup"
                className="border-b border-rule pt-3.5 pb-1 text-left font-normal text-ink-2"
              >
                Worked out from these
              </th>
            </tr>
            {rows(derived)}
          </tbody>
        )}
      </Table>
      {same > 0 && (
        <button
          type="button"
          className="link mt-1.5 min-h-6 text-label phone:min-h-11"
          onClick={() => setWhole(!isWhole)}
        >
          {isWhole ? "Show only what changed" : `Show ${same} fields that did not change`}
        </button>
      )}
    </div>
  );
}
