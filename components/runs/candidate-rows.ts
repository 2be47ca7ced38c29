/** The figures under a match's drawing, in the same order for every match, so that those side by side compare. */
import { decibels, metres, ratio, scaled, significantDigits, type Figure } from "@/lib/format/quantity";
import type { Candidate } from "@/lib/line/match/match-request";
import { vswr } from "@/lib/line/reflection";
import type { AtLimits } from "@/lib/runs/match-limits";
import type { MatchAsked } from "@/lib/runs/matching";

/** A return loss as VSWR; a perfect match is 1. */
export function vswrOf(returnLossDb: number | null): number {
  return returnLossDb === null ? 1 : vswr(10 ** (-returnLossDb / 20));
}

export interface Row {
  label: string;
  value: number;
  /** the smaller is the better, or the larger */
  better: "less" | "more";
  figure: Figure;
}

const word = (digits: string): Figure => ({ digits, unit: "", spoken: "" });

/** @param limits - null where nothing of this match can be off; undefined where no tolerance is asked of any */
export function rowsOf(candidate: Candidate, asked: MatchAsked, limits: AtLimits | null | undefined): Row[] {
  const worst = vswrOf(candidate.worstReturnLossDb);
  const { totalLengthM, bandwidthHz, designReturnLossDb } = candidate;
  return [
    { label: "Worst VSWR over the band", value: worst, better: "less", figure: ratio(worst) },
    {
      label: `Bandwidth at ${significantDigits(asked.returnLossDb, 3)} dB`,
      value: bandwidthHz,
      better: "more",
      figure: scaled("frequency", bandwidthHz, 3),
    },
    ...lossRows(candidate, asked),
    ...(limits === undefined ? [] : [limitsRow(limits, worst), yieldRow(limits, candidate, asked)]),
    ...(asked.notchHz === undefined ? [] : [notchRow(candidate)]),
    {
      label: "Return loss at the design frequency",
      value: designReturnLossDb ?? Infinity,
      better: "more",
      figure: designReturnLossDb === null ? word("exact") : decibels(designReturnLossDb, 1),
    },
    {
      label: "Cable to cut",
      value: totalLengthM,
      better: "less",
      figure: totalLengthM > 0 ? metres(totalLengthM, 3) : word("none"),
    },
  ];
}

function lossRows({ worstMatchLossDb, worstTransducerLossDb }: Candidate, { behind }: MatchAsked): Row[] {
  const row = (label: string, loss: number | null): Row => ({
    label,
    value: loss ?? Infinity,
    better: "less",
    figure: decibels(loss, 3),
  });
  const own = row("Lost in the match", worstMatchLossDb);
  return behind.length === 0 ? [own] : [own, row("Lost up to the load, match included", worstTransducerLossDb)];
}

function limitsRow(limits: AtLimits | null, drawn: number): Row {
  const value = limits ? vswrOf(limits.returnLossDb) : drawn;
  return { label: `Worst VSWR, ${limits?.words ?? "nothing off"}`, value, better: "less", figure: ratio(value) };
}

function yieldRow(limits: AtLimits | null, { worstReturnLossDb }: Candidate, { returnLossDb }: MatchAsked): Row {
  // With nothing off every one made is as drawn.
  const drawn = (worstReturnLossDb ?? Infinity) >= returnLossDb ? 100 : 0;
  const value = limits?.yieldPercent ?? drawn;
  const label = `Of those made so, keep ${significantDigits(returnLossDb, 3)} dB`;
  return { label, value, better: "more", figure: { digits: value.toFixed(1), unit: "%", spoken: "percent" } };
}

/** Only a notch stub keeps anything from the load on purpose. */
function notchRow({ notchLossDb }: Candidate): Row {
  const label = "Kept from the load at the notch";
  if (notchLossDb === undefined) return { label, value: -Infinity, better: "more", figure: word("none") };
  return { label, value: notchLossDb ?? Infinity, better: "more", figure: decibels(notchLossDb, 1) };
}

const shown = ({ figure }: Row) => `${figure.digits} ${figure.unit}`;

/** Best among those side by side, and not shared by all of them; what reads the same is equally good. */
export function isBest(row: Row, index: number, columns: Row[][]): boolean {
  const rows = columns.flatMap((column) => column[index] ?? []);
  const values = rows.map(({ value }) => value);
  const best = row.better === "less" ? Math.min(...values) : Math.max(...values);
  const theBest = rows.find(({ value }) => value === best);
  return theBest !== undefined && shown(row) === shown(theBest) && rows.some((other) => shown(other) !== shown(row));
}
