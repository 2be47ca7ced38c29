/** What the editor's fields make together: the entry as it is sent, the model, the checks. Pure. */
import { checksOf, type Check } from "@/lib/cables/checks";
import { type ReadEntry, readTexts } from "@/lib/cables/editor/read-texts";
import type { EntryTexts } from "@/lib/cables/editor/texts";
import { fromInputs, type Worked } from "@/lib/cables/from-inputs";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { NewCable } from "@/lib/cables/new-cable";
import type { Cable } from "@/lib/cables/schema";
import { figuresOf, otherFigures } from "@/lib/cables/ways/figures";
import { alike } from "@/lib/runs/alike";

/** The fields of an entry that people edit. */
export type EntryDraft = NewCable & { inputs: EntryInputs };

export interface Edited {
  read: ReadEntry;
  worked: Worked;
  /** null while there is no model */
  draft: EntryDraft | null;
  checks: Check[];
}

/** What of an entry no field shows and an edit must not lose. */
export type Kept = Pick<Cable, "figures" | "model">;

/** @param enteredBy - who types, for the sources */
export function editedEntry(texts: EntryTexts, kept: Kept | null, enteredBy?: string): Edited {
  const read = readTexts(texts, enteredBy);
  const { designation, aliases, name, construction, build, limits, inputs } = read;
  const { family } = texts;
  const { lossSlopes, g0SPerM, temperatureCoefficientPerK } = kept?.model ?? {};
  const keptModel = {
    ...(lossSlopes && { lossSlopes }),
    ...(g0SPerM !== undefined && { g0SPerM }),
    ...(temperatureCoefficientPerK !== undefined && { temperatureCoefficientPerK }),
  };
  const worked = fromInputs({ family, construction, build, inputs, kept: keptModel });
  const { model } = worked;
  if (!model) return { read, worked, draft: null, checks: [] };
  const figures = figuresOf(inputs, worked, kept ? otherFigures(kept.figures, inputs) : []);
  const checks = checksOf({ model, figures, construction, build, limits, family, inputs });
  const draft = { designation, aliases, name, family, model, construction, build, figures, limits, inputs };
  return { read, worked, draft, checks };
}

/** The fields in which two drafts differ, with the value of the second: the body of a PATCH. */
export function changeBetween(saved: EntryDraft, next: EntryDraft): Partial<EntryDraft> {
  const keys = Object.keys(next) as (keyof EntryDraft)[];
  return Object.fromEntries(keys.filter((key) => !alike(saved[key], next[key])).map((key) => [key, next[key]]));
}
