/** What a metre of cable weighs. Pure. */
import type { Build, Cable, Construction } from "@/lib/cables/schema";

/** Of a stated figure, kg/m. */
export const massQuantity = "massKgPerM";

/** kg/m³. Copper: IEC 60028, 8.89 g/cm³; plastics: usual values of the solid material, common practice. */
const density = { copper: 8890, PE: 920, PTFE: 2170, PVC: 1350, PUR: 1150, FEP: 2150, LSZH: 1500 };
type Material = keyof typeof density;

/** Permittivity of the solid insulation. */
const permittivity = { PE: 2.28, PTFE: 2.07 };

/** Wall of a screen that is stated without one, mm. */
const usualScreenMm = 0.15;

const isMaterial = (name: string): name is Material => name in density;

/**
 * Share of solid material in a foam: ε^(1/3) = 1 + share·(ε_solid^(1/3) − 1).
 * Source: H. Looyenga, Dielectric constants of heterogeneous mixtures, Physica 31 (1965) 401.
 */
function solidShare(relativePermittivity: number, solid: number): number {
  return Math.min(1, Math.max(0, (Math.cbrt(relativePermittivity) - 1) / (Math.cbrt(solid) - 1)));
}

/**
 * Mass per metre: as stated, else of a coaxial cable from its construction, whose conductor is solid or stranded copper
 * and whose materials are known. An estimate within some tenths, since a braid has holes.
 * @returns kg/m; null when unknown, as for pairs without a stated figure: their lay-up is not part of the entry
 */
export function massPerMetre({
  figures,
  construction,
  build,
}: Pick<Cable, "figures" | "construction" | "build">): number | null {
  const stated = figures.find(({ quantity }) => quantity === massQuantity);
  if (stated) return stated.valueSi;
  return construction?.kind === "coax" && build ? coaxMass(construction, build) : null;
}

function coaxMass(construction: Extract<Construction, { kind: "coax" }>, build: Build): number | null {
  const {
    innerMm,
    dielectricMm,
    relativePermittivity,
    shieldThicknessMm = usualScreenMm,
    outerDiameterMm,
  } = construction;
  const insulation = (["PTFE", "PE"] as const).find((name) => build.dielectricName.includes(name));
  if (/tube|clad/.test(build.conductor) || build.dielectric === "airSpaced" || !insulation) return null;
  if (build.jacket !== null && (!isMaterial(build.jacket) || outerDiameterMm === undefined)) return null;
  const screenMm = dielectricMm + 2 * shieldThicknessMm;
  const share = solidShare(relativePermittivity, permittivity[insulation]);
  const conductors = density.copper * (area(innerMm) + area(screenMm) - area(dielectricMm));
  const dielectric = density[insulation] * share * (area(dielectricMm) - area(innerMm));
  const jacket = build.jacket as Material | null;
  const sheath = jacket ? density[jacket] * Math.max(0, area(outerDiameterMm ?? 0) - area(screenMm)) : 0;
  return conductors + dielectric + sheath;
}

/** m² of a diameter in mm. */
function area(diameterMm: number): number {
  return (Math.PI / 4) * (diameterMm / 1000) ** 2;
}
