/** The demo catalogue's cables as the engine takes them, for runs worked out from them. */
import type { Element, LineModel } from "@/lib/line/element";
import { modelOf } from "@/seeds/cables";
import data from "@/seeds/data/cables.json";

/** @param id - as in the catalogue, "c50-f10" */
export function seededModel(id: string): LineModel {
  const entry = data.cables.find((each) => each.id === id);
  if (!entry) throw new Error(`the demo catalogue has no ${id}`);
  return modelOf(entry.figures);
}

export function seededCable(id: string, lengthM: number): Element {
  return { kind: "cable", line: { cableId: id, model: seededModel(id) }, lengthM };
}
