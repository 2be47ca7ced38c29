import { atTemperature, type ModelAtTemperature } from "@/lib/line/temperature";
import type { LineModel } from "@/lib/line/element";

/** A model at a temperature, °C, or null where the model does not reach that far: its resistance or loss would be gone. */
export function modelAt(model: LineModel, temperatureC: number): ModelAtTemperature | null {
  try {
    return atTemperature(model, temperatureC);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
