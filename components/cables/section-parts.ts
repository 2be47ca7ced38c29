/** The parts of a cable that its drawing names, from the sheath inwards, with the sizes the entry gives and no others. */
import { cableShape, type DrawnCable } from "@/components/line/cable-shape";
import type { Build, Construction } from "@/lib/cables/schema";

export interface SectionPart {
  name: string;
  /** as the entry gives it; null where it does not */
  sizeMm: number | null;
  words: string;
  layer: "jacket" | "screen" | "dielectric" | "conductor";
  /** distance from the middle of the cable at which the part is pointed at, mm; of a core: from the middle of the core */
  atMm: number;
}

type Coax = Extract<Construction, { kind: "coax" }>;
type Pair = Extract<Construction, { kind: "pair" }>;

const some = (...words: (string | null | undefined | false)[]) => words.filter(Boolean).join(", ");

function coaxParts(construction: Coax, build: Build | null, shape: NonNullable<ReturnType<typeof cableShape>>) {
  const { innerMm, dielectricMm, shieldThicknessMm, outerDiameterMm = null, relativePermittivity } = construction;
  const screenMm = shape.screen?.outerMm ?? dielectricMm;
  const parts: SectionPart[] = [];
  if (shape.hasJacket)
    parts.push({
      ...{ name: "Jacket", sizeMm: outerDiameterMm, words: build?.jacket ?? "", layer: "jacket" },
      atMm: (shape.outerMm + screenMm) / 4,
    });
  const given = shieldThicknessMm === undefined ? null : dielectricMm + 2 * shieldThicknessMm;
  parts.push({
    ...{ name: "Shield", layer: "screen", atMm: (screenMm + dielectricMm) / 4 },
    sizeMm: shape.hasJacket ? given : outerDiameterMm,
    words: some(build?.screenName, shape.hasJacket && given === null && "thickness not given"),
  });
  parts.push({
    ...{ name: "Dielectric", sizeMm: dielectricMm, layer: "dielectric", atMm: dielectricMm * 0.38 + innerMm * 0.12 },
    words: some(dielectricWords(build), `ε ${Number(relativePermittivity.toPrecision(4))}`),
  });
  parts.push({
    ...{ name: "Inner", sizeMm: innerMm, words: build?.conductor ?? "", layer: "conductor", atMm: innerMm * 0.25 },
  });
  return parts;
}

function pairParts(construction: Pair, build: Build | null, shape: NonNullable<ReturnType<typeof cableShape>>) {
  const { wireMm, spacingMm, layMm, screen, outerDiameterMm = null } = construction;
  const screenMm = shape.screen?.outerMm ?? 0;
  const parts: SectionPart[] = [];
  if (shape.hasJacket)
    parts.push({
      ...{ name: "Jacket", sizeMm: outerDiameterMm, words: build?.jacket ?? "", layer: "jacket" },
      atMm: (shape.outerMm + (screenMm || shape.outerMm * 0.86)) / 4,
    });
  if (shape.screen)
    parts.push({
      ...{ name: "Screen", sizeMm: screen?.innerMm ?? null, layer: "screen" },
      atMm: (screenMm + shape.screen.innerMm) / 4,
      words: some(build?.screenName, screen ? "bore" : "bore not given"),
    });
  const count = build && build.pairCount > 1 ? `${build.pairCount} pairs` : "";
  parts.push({
    ...{ name: "Spacing", sizeMm: spacingMm, layer: "dielectric", atMm: spacingMm * 0.4 },
    words: some("between the wires", dielectricWords(build), count, layMm !== undefined && `lay ${layMm} mm`),
  });
  parts.push({ ...{ name: "Wire", sizeMm: wireMm, words: build?.conductor ?? "", layer: "conductor", atMm: 0 } });
  return parts;
}

function dielectricWords(build: Build | null): string {
  if (!build) return "";
  const kind = { foam: "foam", airSpaced: "air-spaced", solid: "solid" }[build.dielectric];
  const { dielectricName } = build;
  return dielectricName.toLowerCase().includes(kind) ? dielectricName : `${kind} ${dielectricName}`.trim();
}

/** The parts of a cable, from the sheath inwards; none where its construction is not known. */
export function sectionParts(cable: DrawnCable): SectionPart[] {
  const { construction, build } = cable;
  const shape = cableShape(cable);
  if (!construction || !shape) return [];
  return construction.kind === "coax" ? coaxParts(construction, build, shape) : pairParts(construction, build, shape);
}

/** Diameter the section may have on an entry, px. */
export const sectionRoomPx = 184;
/** px of a CSS millimetre: 96 px to the inch. */
const pxPerMm = 96 / 25.4;
const enlargements = [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10, 12, 15, 20, 25, 30, 40, 50];

/** The largest round enlargement at which a cable fits into so many px, and what it makes of a millimetre. */
export function enlargementFor(outerMm: number, roomPx: number): { ratio: number; mmToPx: number } {
  const fits = enlargements.filter((ratio) => outerMm * ratio * pxPerMm <= roomPx);
  const ratio = fits.at(-1) ?? Math.max(0.01, Number((roomPx / (outerMm * pxPerMm)).toPrecision(1)));
  return { ratio, mmToPx: ratio * pxPerMm };
}

/** Words broken into lines of about so many letters. */
export function brokenInto(words: string, letters: number): string[] {
  const lines: string[] = [];
  for (const word of words.split(" ").filter(Boolean)) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + 1 + word.length <= letters) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}
