/** What has been given of each way in, and what the checks make of it. Pure. */
import type { Check } from "@/lib/cables/checks";
import type { Edited } from "@/lib/cables/editor/entry-draft";
import type { SourceWay } from "@/lib/cables/editor/texts";

export interface WayState {
  way: SourceWay;
  title: string;
  /** "3 of 3 given" */
  words: string;
  state: "none" | "fine" | "look" | "contradiction";
}

const titles: Record<SourceWay, string> = {
  construction: "Construction",
  nominal: "Nominal figures",
  lossTable: "Loss table",
  readings: "Meter readings",
};

/** Which way a check speaks of. */
const checksOfWay: Record<SourceWay, readonly string[]> = {
  construction: ["construction", "conductorResistance", "cutoff"],
  nominal: ["triangle", "inductance", "coreCapacitance", "loopResistance", "velocity"],
  lossTable: ["lossRises", "lossRow", "lossUnit", "dcFloor", "smoothCopper", "lossTangent", "lossTable"],
  readings: ["meterCapacitance", "meterInductance", "meterResistance", "delay"],
};

function worstOf(checks: readonly Check[], way: SourceWay): { state: WayState["state"]; open: number } {
  const own = checks.filter(({ check }) => checksOfWay[way].includes(check));
  const open = own.filter(({ verdict }) => verdict !== "fine");
  const state = open.some(({ verdict }) => verdict === "contradiction")
    ? "contradiction"
    : open.length > 0
      ? "look"
      : "fine";
  return { state, open: open.length };
}

const count = (values: readonly unknown[]) => values.filter((value) => value !== undefined).length;

export function wayStates({ read, worked, checks }: Edited): WayState[] {
  const { nominal, readings, lossTable, sweep } = read.inputs;
  const rows = lossTable?.rows.length ?? 0;
  const ofNominal = count([nominal?.z0Ohm, nominal?.velocityFactor, nominal?.cFPerM]);
  const ofReadings = count([
    readings?.openCapacitanceF,
    readings?.shortInductanceH,
    readings?.oneWayDelayS ?? readings?.roundTripS,
  ]);
  const isDrawn = read.construction !== null;
  const given: Record<SourceWay, [boolean, string]> = {
    construction: [isDrawn, worked.ways.construction?.refusal ?? (isDrawn ? "drawn" : "two sizes and a permittivity")],
    nominal: [nominal !== undefined, `${ofNominal} of 3 given`],
    lossTable: [rows > 0, rows === 1 ? "1 point" : `${rows} points`],
    readings: [readings !== undefined || sweep !== undefined, `${ofReadings} of 3 given${sweep ? ", a sweep" : ""}`],
  };
  return (Object.keys(titles) as SourceWay[]).map((way) => {
    const [isGiven, words] = given[way];
    const { state, open } = worstOf(checks, way);
    const more = isGiven && open > 0 ? `, ${open} to look at` : "";
    return { way, title: titles[way], words: `${words}${more}`, state: isGiven ? state : "none" };
  });
}
