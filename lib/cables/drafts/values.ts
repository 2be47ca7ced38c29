/** The columns of a revision that follow from what an entry is given. Pure. */
import { derivedFigures } from "@/lib/cables/model";
import type { NewCable } from "@/lib/cables/new-cable";
import { cableWords } from "@/lib/cables/words";
import { AppError } from "@/lib/http/errors";

/**
 * The values of a revision, with those that search and sort by.
 * @throws AppError `invalid_input` where the model has no finite figures
 */
export function revisionValues(entry: NewCable) {
  const { name, family, model, construction, build, figures, limits } = entry;
  const derived = derivedFigures(model, construction, limits);
  if (!Object.values(derived).every((value) => value === null || Number.isFinite(value)))
    throw new AppError("invalid_input", "The entry was not written.", {
      model: ["These values give no finite impedance, velocity or loss."],
    });
  return { name, family, model, construction, build, figures, limits, ...derived, words: cableWords(entry) };
}
