/** What becomes of an entry that was read from a file, before the catalogue has been asked. Pure. */
import { type CatalogueEntry, catalogueEntrySchema } from "@/lib/cables/exchange/catalogue";
import { cleanedTexts, strangeIn } from "@/lib/cables/exchange/plain-text";
import { checksOf } from "@/lib/cables/checks";
import { derivedFigures } from "@/lib/cables/model";
import { cableWords } from "@/lib/cables/words";
import { fieldErrorsOf, plainSentence } from "@/lib/http/parse";

export type Outcome =
  /** will be a draft */
  | "draft"
  /** contradicts itself: will be an entry in quarantine */
  | "quarantined"
  /** its designation stands in the file before it, or in the catalogue with other values: kept, not brought in */
  | "duplicate"
  /** is in the catalogue as it is */
  | "unchanged"
  /** cannot be an entry: kept with the reason */
  | "noEntry";

/** What is stored beside the values of an entry that is to be brought in. */
export interface Prepared {
  entry: CatalogueEntry;
  derived: ReturnType<typeof derivedFigures>;
  words: string;
}

export interface Judged {
  designation: string | null;
  outcome: Outcome;
  /** why it is not a draft, sentences */
  faults: string[];
  /** what was understood, and what to look at, sentences */
  notes: string[];
  /** of a draft or a quarantined entry */
  prepared?: Prepared;
}

const mostNotes = 20;

function checked(entry: CatalogueEntry): { faults: string[]; notes: string[]; isQuarantined: boolean } {
  const checks = checksOf(entry);
  const said = (verdict: string) => checks.filter((check) => check.verdict === verdict).map(({ sentence }) => sentence);
  const faults = said("contradiction");
  const notes = said("look");
  const state = entry.standing?.state;
  if (state === "quarantined") faults.push("It was quarantined where it was taken out.");
  if (state === "superseded" || state === "withdrawn")
    notes.push(`It was ${state} where it was taken out; here it starts as a draft.`);
  return { faults, notes, isQuarantined: faults.length > 0 };
}

const designationOf = (entry: unknown) => {
  const { designation } = (entry ?? {}) as { designation?: unknown };
  return typeof designation === "string" && designation.trim() !== "" ? designation.trim() : null;
};

/** @returns a judge that knows the designations it has seen */
export function judged(): (read: unknown, faults: readonly string[], notes: readonly string[]) => Judged {
  const seen = new Set<string>();
  return (read, given, said) => {
    const notes = [...said];
    const whole = designationOf(read);
    const strange = whole === null ? undefined : strangeIn(whole);
    const designation = whole === null ? null : whole.slice(0, 60);
    const no = (faults: string[]): Judged => ({
      designation,
      outcome: "noEntry",
      faults,
      notes: notes.slice(0, mostNotes),
    });
    if (strange) return { ...no([`The designation holds ${strange}; write it anew.`]), designation: null };
    if (given.length > 0) return no([...given]);
    const clean = cleanedTexts(read, (what) => notes.push(`A text held ${what}; it was taken out.`));
    const parsed = catalogueEntrySchema.safeParse(clean, { error: plainSentence });
    if (!parsed.success) return no(faultsOf(parsed.error));
    const entry = parsed.data;
    const derived = derivedFigures(entry.model, entry.construction, entry.limits);
    if (!Object.values(derived).every((value) => value === null || Number.isFinite(value)))
      return no(["Its values give no finite impedance, velocity or loss."]);
    if (seen.has(entry.designation))
      return { designation, outcome: "duplicate", faults: ["The file has this designation before."], notes };
    seen.add(entry.designation);
    const { faults, notes: looks, isQuarantined } = checked(entry);
    const prepared = { entry, derived, words: cableWords(entry) };
    const outcome = isQuarantined ? "quarantined" : "draft";
    return { designation, outcome, faults, notes: [...notes, ...looks].slice(0, mostNotes), prepared };
  };
}

function faultsOf(error: Parameters<typeof fieldErrorsOf>[0]): string[] {
  return Object.entries(fieldErrorsOf(error))
    .slice(0, mostNotes)
    .flatMap(([path, sentences]) => sentences.map((sentence) => (path ? `${path}: ${sentence}` : sentence)));
}
