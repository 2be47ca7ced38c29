import type { Estimate } from "@/lib/cables/ways/estimate";
import type { LineModel } from "@/lib/line/element";

/** A way to describe a cable. */
export type Way = "construction" | "nominal" | "lossTable" | "readings" | "sweep";

/** What one way says of a cable; what it does not say is absent. */
export interface WayResult {
  /** ohm */
  z0?: Estimate;
  velocityFactor?: Estimate;
  /** F/m */
  capacitance?: Estimate;
  /** high-frequency, H/m */
  inductance?: Estimate;
  /** loop, ohm per metre of cable at 20 °C */
  loopResistance?: Estimate;
  /** of the inner conductor, or of one wire, ohm per metre of cable */
  conductorResistance?: Estimate;
  /** of the insulation */
  lossTangent?: number;
  /** a whole line, where the way gives one */
  model?: LineModel;
  /** why the way, though begun, says nothing; a sentence */
  refusal?: string;
  /** what was taken for granted; sentences */
  notes: string[];
}

export type Ways = Partial<Record<Way, WayResult>>;
