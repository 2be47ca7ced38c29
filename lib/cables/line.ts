/** What a run needs to know of a cable: enough to compute with it, draw it and name it. */
import type { Build, Cable, CableState, Construction, Family, Limits } from "@/lib/cables/schema";
import type { LineModel } from "@/lib/line/element";

export interface CableLine {
  cableId: string;
  revision: number;
  designation: string;
  name: string;
  family: Family;
  state: CableState;
  condition: string | null;
  model: LineModel;
  construction: Construction | null;
  build: Build | null;
  outerDiameterMm: number | null;
  limits: Limits;
}

/** Stands for the cable's id where a cable is typed. */
export const typedCable = "typed";

/** Sheath diameter as stated in the construction, mm. */
export function outerDiameterMm(construction: Construction | null): number | null {
  return construction?.outerDiameterMm ?? null;
}

export function lineOf(cable: Cable): CableLine {
  const { id, revision, designation, name, family, state, condition, model, construction, build, limits } = cable;
  return {
    cableId: id,
    revision,
    designation,
    name,
    family,
    state,
    condition,
    model,
    construction,
    build,
    outerDiameterMm: outerDiameterMm(construction),
    limits,
  };
}
