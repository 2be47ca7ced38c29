/**
 * What of a cable's construction is drawn: the diameters of its layers and what each is made of. All lengths in
 * millimetres; all sizes are diameters. What the construction leaves open is filled with a plain proportion, so that
 * a drawing never claims more than order and kind there.
 */
import type { Build, Construction, Family } from "@/lib/cables/schema";

export type Covering = "braid" | "solid";

interface Common {
  outerMm: number;
  hasJacket: boolean;
  /** null without a screen */
  screen: { outerMm: number; innerMm: number; covering: Covering } | null;
  isStranded: boolean;
  dielectric: Build["dielectric"];
}

export interface CoaxShape extends Common {
  kind: "coax";
  dielectricMm: number;
  innerMm: number;
  isTube: boolean;
}

export interface PairShape extends Common {
  kind: "pair";
  wireMm: number;
  /** insulated wire */
  coreMm: number;
  pairCount: number;
  isTwisted: boolean;
  hasDrain: boolean;
}

export type CableShape = CoaxShape | PairShape;

export interface DrawnCable {
  construction: Construction | null;
  build: Build | null;
  outerDiameterMm: number | null;
  family?: Family;
}

type Coax = Extract<Construction, { kind: "coax" }>;
type Pair = Extract<Construction, { kind: "pair" }>;

function coveringOf(build: Build | null): Covering {
  const screen = build?.screen ?? ["braid"];
  return screen.includes("braid") || screen.includes("doubleBraid") ? "braid" : "solid";
}

/** Thickness of a shield whose thickness nobody gave, mm, before it is fitted into the room there is. */
function usualShieldMm(build: Build | null, dielectricMm: number): number {
  const screen = build?.screen ?? ["braid"];
  if (screen.includes("corrugated")) return 0.055 * dielectricMm;
  if (screen.includes("doubleBraid")) return 0.4 + 0.03 * dielectricMm;
  return 0.15 + 0.03 * dielectricMm;
}

function coaxShape(construction: Coax, build: Build | null, outerDiameterMm: number | null): CoaxShape {
  const hasJacket = build ? build.jacket !== null : true;
  const { innerMm, dielectricMm } = construction;
  const given = outerDiameterMm ?? construction.outerDiameterMm;
  const usual = construction.shieldThicknessMm ?? usualShieldMm(build, dielectricMm);
  const outerMm = Math.max(given ?? (dielectricMm + 2 * usual) * (hasJacket ? 1.25 : 1), dielectricMm * 1.02);
  const room = (outerMm - dielectricMm) / 2;
  const shield = hasJacket ? Math.min(usual, room * 0.6) : room;
  return {
    kind: "coax",
    outerMm,
    hasJacket,
    screen: { outerMm: dielectricMm + 2 * shield, innerMm: dielectricMm, covering: coveringOf(build) },
    isStranded: build?.isStranded ?? (construction.strandFactor ?? 1) > 1,
    dielectric: build?.dielectric ?? (construction.relativePermittivity < 1.9 ? "foam" : "solid"),
    dielectricMm,
    innerMm,
    isTube: /\btube\b/i.test(build?.conductor ?? ""),
  };
}

/** Radius of the circle that `count` pairs of insulated wires lie in, in diameters of one insulated wire. */
function bundle(count: number): number {
  return count === 1 ? 1 : 1 + 1 / Math.sin(Math.PI / Math.max(2, count));
}

function pairShape(
  construction: Pair,
  build: Build | null,
  outerDiameterMm: number | null,
  family?: Family,
): PairShape {
  const pairCount = build?.pairCount ?? 1;
  const hasJacket = build ? build.jacket !== null : true;
  const { wireMm, spacingMm } = construction;
  const room = 2 * spacingMm * bundle(pairCount);
  const given = outerDiameterMm ?? construction.outerDiameterMm;
  const outerMm = Math.max(given ?? room * (hasJacket ? 1.4 : 1.1), room * 1.02);
  const hasScreen = build ? build.screen.length > 0 : construction.screen !== undefined;
  const screenOuter = Math.max(outerMm * (hasJacket ? 0.81 : 1), room * 1.01);
  const screenInner = Math.max(construction.screen?.innerMm ?? outerMm * (hasJacket ? 0.74 : 0.93), room);
  return {
    kind: "pair",
    outerMm,
    hasJacket,
    screen: hasScreen
      ? { outerMm: screenOuter, innerMm: Math.min(screenInner, screenOuter * 0.98), covering: coveringOf(build) }
      : null,
    isStranded: build?.isStranded ?? false,
    dielectric: build?.dielectric ?? "solid",
    wireMm,
    coreMm: Math.max(spacingMm, wireMm * 1.1),
    pairCount,
    isTwisted: family ? family === "twistedPair" : construction.layMm !== undefined,
    hasDrain: build?.screen.includes("drain") ?? false,
  };
}

/** The shape of a cable, or null where its construction is not known. */
export function cableShape({ construction, build, outerDiameterMm, family }: DrawnCable): CableShape | null {
  if (!construction) return null;
  return construction.kind === "coax"
    ? coaxShape(construction, build, outerDiameterMm)
    : pairShape(construction, build, outerDiameterMm, family);
}
