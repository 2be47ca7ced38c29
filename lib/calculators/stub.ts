/** What a stub of a cable is, the length for a wanted reactance, and a quarter-wave section. Pure. */
import { temperatureRefusal } from "@/lib/calculators/attenuation";
import { readGivenLength, type GivenLength } from "@/lib/calculators/electrical-length";
import { chosenLine, lineInputs, type ChosenLine } from "@/lib/calculators/line-inputs";
import { chosen, fault, found, quantity, typed, type Outcome, type Values } from "@/lib/calculators/input";
import { readWantedReactance, wantedOhm } from "@/lib/calculators/reactance-wanted";
import type { CableLine } from "@/lib/cables/line";
import { complex, type Complex } from "@/lib/line/complex";
import { quarterWaveBandwidth, sectionImpedance, sectionReflection } from "@/lib/line/match/quarter-wave";
import { seriesSection } from "@/lib/line/match/series-section";
import { partOfReactance, type ReactivePart } from "@/lib/line/reactance";
import { returnLossDb } from "@/lib/line/reflection";
import { spotFigures, type SpotFigures } from "@/lib/line/spot-figures";
import { greatestReactance, shuntLossDb, stubImpedance, stubLengths, type StubEnd } from "@/lib/line/stub";

const resistance = { isPositive: true, most: 1e6 } as const;

export const stubInputs = {
  ...lineInputs,
  frequency: quantity("frequency", "Frequency", "100 MHz", { isPositive: true, most: 1e12 }),
  temperature: quantity("temperature", "Temperature", "20", { least: -200, most: 400 }),
  end: chosen("Far end", "open", [
    ["open", "open"],
    ["short", "shorted"],
  ]),
  length: typed("Stub length", "λ/4", readGivenLength),
  across: quantity("resistance", "Across a line of", "50", resistance),
  wanted: typed("Reactance wanted", "j50", readWantedReactance),
  source: quantity("resistance", "Section from", "50", resistance),
  load: quantity("resistance", "to", "75", resistance),
};

export interface StubResult {
  lengthM: number;
  wavelengths: number;
  impedance: Complex;
  /** the coil or capacitor it stands for */
  part: ReactivePart | undefined;
  /** |X|/R; Infinity without loss */
  q: number;
  acrossDb: number;
}

/** A stub cut for a wanted reactance. */
export interface CutStub {
  end: StubEnd;
  lengthM: number;
  impedance: Complex;
}

export interface SectionResult {
  neededOhm: number;
  /** of the chosen cable */
  lengthM: number;
  /** what the chosen cable itself would reach as the section, dB */
  ownReturnLossDb: number;
  /** width over design frequency within which an exact section keeps 20 dB */
  bandwidth: number;
  /** each of two sections made of the two impedances themselves, wavelengths; null where they are equal */
  alternating: number | null;
}

export interface StubAndSection {
  line: ChosenLine;
  spot: SpotFigures;
  stub: StubResult;
  wantedOhm: number;
  cuts: CutStub[];
  /** what this cable's loss leaves reachable, ohm, where a wanted reactance is not reached */
  reach: Record<StubEnd, { capacitive: number; inductive: number }>;
  section: SectionResult;
}

export function stubAndSection(
  values: Values<typeof stubInputs>,
  entries: ReadonlyMap<string, CableLine>,
): Outcome<StubAndSection> {
  const line = chosenLine(values, entries);
  if (!line) return fault("cable", "This cable is on its way.");
  const { frequency, temperature } = values;
  const refusal = temperatureRefusal(line, temperature);
  if (refusal) return fault("temperature", refusal);
  const spot = spotFigures(line.model, frequency, temperature);
  const lengthM = metresOf(values.length, spot);
  if (!(lengthM < 1e9)) return fault("length", "Longer than a million kilometres.");
  const ohm = wantedOhm(values.wanted, frequency);
  return found({
    line,
    spot,
    stub: stubOf(spot, lengthM, values.end, values.across),
    wantedOhm: ohm,
    cuts: (["short", "open"] as const).flatMap((end) =>
      stubLengths(spot, ohm, end).map((cut) => ({ end, lengthM: cut, impedance: stubImpedance(spot, cut, end) })),
    ),
    reach: { open: greatestReactance(spot, "open"), short: greatestReactance(spot, "short") },
    section: sectionOf(spot, values.source, values.load),
  });
}

function metresOf(given: GivenLength, spot: SpotFigures): number {
  if (given.kind === "length") return given.metres;
  return given.kind === "angle" ? given.radians / spot.phaseRadPerM : given.seconds / spot.phaseDelaySPerM;
}

function stubOf(spot: SpotFigures, lengthM: number, end: StubEnd, acrossOhm: number): StubResult {
  const impedance = stubImpedance(spot, lengthM, end);
  return {
    lengthM,
    wavelengths: lengthM / spot.wavelengthM,
    impedance,
    part: partOfReactance(impedance.im, spot.frequency),
    q: Math.abs(impedance.im) / impedance.re,
    acrossDb: shuntLossDb(impedance, acrossOhm),
  };
}

/** Reflection of 20 dB, within which an exact section's bandwidth is told. */
const sectionLimit = 0.1;

function sectionOf(spot: SpotFigures, source: number, load: number): SectionResult {
  const plan = { load: complex(load), lineOhm: source, sectionOhm: load, targetOhm: source };
  const alternating = seriesSection(plan)
    .filter(({ distance, length }) => Math.abs(distance - length) < 1e-9)
    .map(({ length }) => length);
  return {
    neededOhm: sectionImpedance(source, load),
    lengthM: spot.wavelengthM / 4,
    ownReturnLossDb: returnLossDb(sectionReflection(spot.zc.re, source, load)),
    bandwidth: quarterWaveBandwidth(source, load, sectionLimit),
    alternating: alternating.length > 0 ? Math.min(...alternating) : null,
  };
}
