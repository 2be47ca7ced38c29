"use client";

import type { Route } from "next";
import Link from "next/link";
import { useState } from "react";
import { outcomes, outcomeWords } from "@/components/cables/import-words";
import { Button } from "@/components/ui/button";
import { Section } from "@/components/ui/section";
import { StateMark } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import type { ImportOutcome, ImportReport as Report, ImportRow } from "@/lib/cables/imports/schema";
import { digits, significantDigits } from "@/lib/format/quantity";

const atOnce = 100;

function Counts({
  report,
  only,
  show,
}: {
  report: Report;
  only?: ImportOutcome;
  show: (only?: ImportOutcome) => void;
}) {
  return (
    <ul className="mt-2 flex flex-wrap gap-x-5 gap-y-1.5" aria-label="Rows by what becomes of them">
      {outcomes
        .filter((outcome) => report.counts[outcome] > 0)
        .map((outcome) => (
          <li key={outcome}>
            <button
              type="button"
              aria-pressed={only === outcome}
              title={outcomeWords[outcome].meaning}
              onClick={() => show(only === outcome ? undefined : outcome)}
              className={`flex items-center gap-1.5 rounded px-1 phone:min-h-11 ${only === outcome ? "bg-hemp" : "hover:bg-hemp"}`}
            >
              <b className="figures">{report.counts[outcome]}</b>
              <StateMark state={outcomeWords[outcome].mark}>{outcomeWords[outcome].word}</StateMark>
            </button>
          </li>
        ))}
    </ul>
  );
}

/** What each column was taken for: where a wrong unit would be seen first. */
function Columns({ columns }: Pick<Report, "columns">) {
  if (columns.length === 0) return null;
  const unread = columns.filter(({ readAs }) => readAs === null);
  return (
    <details className="mt-3 text-label">
      <summary className="link cursor-pointer">
        {columns.length - unread.length} of {columns.length} columns are read
        {unread.length > 0 && `; not ${unread.map(({ head }) => `“${head}”`).join(", ")}`}
      </summary>
      <dl className="mt-1.5 grid grid-cols-[minmax(0,1fr)_minmax(0,1.4fr)] gap-x-4 border-l border-rule pl-2.5">
        {columns.map(({ head, readAs }, i) => (
          <div key={i} className="contents">
            <dt className="break-words text-ink-2">{head || "(no head)"}</dt>
            <dd className={readAs === null ? "text-ink-3" : ""}>{readAs ?? "not understood, not read"}</dd>
          </div>
        ))}
      </dl>
    </details>
  );
}

function Sentences({ row }: { row: ImportRow }) {
  return (
    <>
      {row.faults.map((fault, i) => (
        <span key={`f${i}`} className="block">
          {fault}
        </span>
      ))}
      {row.notes.map((note, i) => (
        <span key={`n${i}`} className="block text-ink-3">
          {note}
        </span>
      ))}
    </>
  );
}

function Line({ row }: { row: ImportRow }) {
  const { word, mark } = outcomeWords[row.outcome];
  const figures = row.figures;
  return (
    <tr>
      <Cell isRight className="figures w-10 text-ink-3">
        {row.row}
      </Cell>
      <RowHead className="pl-3 break-words">
        {row.cableId ? (
          <Link href={`/cables/${encodeURIComponent(row.cableId)}` as Route} className="link">
            {row.designation}
          </Link>
        ) : (
          (row.designation ?? <span className="text-ink-3">none</span>)
        )}
        <span className="mt-0.5 hidden phone:block">
          <StateMark state={mark}>{word}</StateMark>
          <span className="block text-note">
            <Sentences row={row} />
          </span>
        </span>
      </RowHead>
      <Cell className="phone:hidden">
        <StateMark state={mark}>{word}</StateMark>
      </Cell>
      <Cell isRight className="figures">
        {figures ? digits(figures.z0Ohm, 1) : "–"}
      </Cell>
      <Cell isRight className="figures">
        {figures ? digits(figures.velocityFactor, 3) : "–"}
      </Cell>
      <Cell isRight className="figures phone:hidden">
        {figures ? significantDigits(figures.lossDbPer100m, 3) : "–"}
      </Cell>
      <Cell className="pl-4 phone:hidden">
        <Sentences row={row} />
      </Cell>
    </tr>
  );
}

/** What was read of a file, row by row; the rows that want looking at can be shown alone. */
export function ImportReport({ report }: { report: Report }) {
  const [only, setOnly] = useState<ImportOutcome>();
  const [shown, setShown] = useState(atOnce);
  const rows = only ? report.rows.filter(({ outcome }) => outcome === only) : report.rows;
  const show = (outcome?: ImportOutcome) => {
    setOnly(outcome);
    setShown(atOnce);
  };
  return (
    <Section title="Row by row" note={`${report.rowCount} in ${report.fileName}`} className="mt-6">
      <Counts report={report} only={only} show={show} />
      {report.notes.length > 0 && <p className="mt-2 text-label text-ink-2">{report.notes.join(" ")}</p>}
      <Columns columns={report.columns} />
      <Table className="mt-3">
        <thead>
          <tr>
            <HeadCell isRight>Row</HeadCell>
            <HeadCell className="pl-3">Designation</HeadCell>
            <HeadCell className="phone:hidden">Becomes</HeadCell>
            <HeadCell isRight>
              Z<sub>0</sub>, Ω
            </HeadCell>
            <HeadCell isRight>Velocity</HeadCell>
            <HeadCell isRight className="phone:hidden">
              dB/100 m, 1 GHz
            </HeadCell>
            <HeadCell className="pl-4 phone:hidden">Why, and what was understood</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.slice(0, shown).map((row) => (
            <Line key={row.row} row={row} />
          ))}
        </tbody>
      </Table>
      {rows.length > shown && (
        <p className="mt-3 flex flex-wrap items-center gap-3 text-label text-ink-2">
          {shown} of {rows.length} rows
          <Button size="small" onClick={() => setShown(shown + atOnce)}>
            Show more
          </Button>
        </p>
      )}
    </Section>
  );
}
