import { modelFromNominal } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { CableElement } from "@/lib/line/element";
import type { DesignLine, DesignPoint } from "@/lib/line/match/design-point";
import type { MatchPieceName } from "@/lib/line/match/piece-name";
import { ohmText } from "@/lib/line/match/wording";

/** A section's line: a cable, several of it side by side, or an ideal line. */
export interface SectionLine {
  line: DesignLine;
  count: number;
  isIdeal: boolean;
}

/** Lengths side by side that are still joined by hand. */
export const mostCables = 4;

/**
 * The line, alone or else two to four of it side by side, whose impedance is nearest to a wanted one by ratio.
 * @param ohm - wanted, above 0
 * @param share - largest ratio less 1 that still counts as that impedance
 * @returns undefined where no line comes that near
 */
export function fitLine(lines: readonly DesignLine[], ohm: number, share: number): SectionLine | undefined {
  const best = (counts: number[]) => {
    const all = lines.flatMap((line) =>
      counts.map((count) => ({ line, count, off: Math.abs(Math.log(line.zc.re / count / ohm)) })),
    );
    const fit = all.filter(({ off }) => off <= Math.log1p(share));
    return fit.sort((a, b) => a.off - b.off || a.line.label.localeCompare(b.line.label))[0];
  };
  const found = best([1]) ?? best(Array.from({ length: mostCables - 1 }, (_, k) => k + 2));
  return found && { line: found.line, count: found.count, isIdeal: false };
}

/** A lossless line in air of an impedance that no cable has: what would have to be made. */
export function idealLine({ request }: DesignPoint, ohm: number): SectionLine {
  const { designHz } = request;
  const line: DesignLine = {
    line: { model: modelFromNominal({ z0: ohm, velocityFactor: 1 }) },
    label: `ideal line of ${ohmText(ohm)}`,
    gamma: { re: 0, im: (2 * Math.PI * designHz) / SPEED_OF_LIGHT },
    zc: { re: ohm, im: 0 },
    wavelengthM: SPEED_OF_LIGHT / designHz,
    velocityFactor: 1,
  };
  return { line, count: 1, isIdeal: true };
}

/** A length of a section's line as an element. */
export function sectionElement({ line, count }: SectionLine, name: MatchPieceName, lengthM: number): CableElement {
  return { kind: "cable", name, line: line.line, lengthM, ...(count > 1 ? { paralleled: count } : {}) };
}

/** "2 × C50-F10", "C75-F7", "ideal line of 57.5 Ω". */
export function sectionLabel({ line, count }: SectionLine): string {
  return count > 1 ? `${count} × ${line.label}` : line.label;
}

/** Impedance of a section, ohm. */
export function sectionOhm({ line, count }: SectionLine): number {
  return line.zc.re / count;
}
