/** Which cables of the catalogue could be a quarter-wave section, alone or two side by side. Pure. */
import type { CableItem } from "@/lib/cables/schema";
import { sectionReflection } from "@/lib/line/match/quarter-wave";
import { returnLossDb } from "@/lib/line/reflection";

/** Cables laid side by side as one section have the impedance of one over their number. */
const counts = [1, 2] as const;
/** Neighbours looked at on either side of the needed impedance. */
const neighbours = 3;

export interface SectionRequest {
  count: 1 | 2;
  /** of the API, without its prefix */
  path: string;
}

/** What to ask of the catalogue: the nearest impedances below and above, for one cable and for two in parallel. */
export function sectionRequests(neededOhm: number): SectionRequest[] {
  return counts.flatMap((count) => {
    const ohm = Number((neededOhm * count).toPrecision(6));
    return [`z0Ohm=..${ohm}&sort=-z0`, `z0Ohm=${ohm}..&sort=z0`].map((range) => ({
      count,
      path: `/cables?${range}&limit=${neighbours}`,
    }));
  });
}

export interface SectionCandidate {
  item: CableItem;
  count: 1 | 2;
  /** of the section, ohm */
  sectionOhm: number;
  /** at the design frequency, without loss, dB; Infinity for an exact section */
  returnLossDb: number;
}

const most = 5;
/** Beyond this return loss, dB, sections are as good as one another: no cable keeps its impedance more closely. */
const alikeDb = 40;

/** The candidates from best to worst, each cable once in each number; of those alike, one cable before two. */
export function rankedSections(
  found: readonly { count: 1 | 2; items: readonly CableItem[] }[],
  sourceOhm: number,
  loadOhm: number,
): SectionCandidate[] {
  const byKey = new Map<string, SectionCandidate>();
  for (const { count, items } of found)
    for (const item of items) {
      const sectionOhm = item.z0Ohm / count;
      const reflection = sectionReflection(sectionOhm, sourceOhm, loadOhm);
      byKey.set(`${item.id} ${count}`, { item, count, sectionOhm, returnLossDb: returnLossDb(reflection) });
    }
  return [...byKey.values()].sort(compareSections).slice(0, most);
}

function compareSections(a: SectionCandidate, b: SectionCandidate): number {
  const better = Math.min(b.returnLossDb, alikeDb) - Math.min(a.returnLossDb, alikeDb);
  return better || a.count - b.count || b.returnLossDb - a.returnLossDb;
}
