/** What is given with a step in the life of a revision. Pure. */
import { z } from "zod";
import { successorSchema } from "@/lib/cables/schema";
import { plain } from "@/lib/http/plain-text";

const most = 1000;
const text = (what: string) =>
  plain(
    z
      .string({ error: `${what} is text.` })
      .trim()
      .max(most, { error: `${what} has at most ${most} characters.` }),
    what,
  );
const note = text("A note");
const needed = (what: string, sentence: string) => text(what).min(1, { error: sentence });

const condition = text("The condition").min(1, { error: "Say under which condition it may be used." });

export const submitSchema = z
  .strictObject({ note: note.default("").describe("what the reviewer should know") })
  .meta({ id: "Submission" });

export const approveSchema = z
  .strictObject({
    note: note.default(""),
    answers: z
      .record(z.string().max(60), needed("An answer", "Say what you make of it."), {
        error: "Answers are an object: a sentence by the name of its check.",
      })
      .default({})
      .describe("what the reviewer makes of each check whose verdict is look, by the name of the check"),
    condition: condition
      .nullable()
      .optional()
      .describe("a use condition; null lifts that of the revision before, which else carries over"),
  })
  .meta({ id: "Approval" });
export type Approval = z.output<typeof approveSchema>;

export const returnSchema = z
  .strictObject({ note: needed("A note", "Say what has to change before it can be approved.") })
  .meta({ id: "Return" });

export const restrictSchema = z.strictObject({ condition, note: note.default("") }).meta({ id: "Restriction" });

export const quarantineSchema = z
  .strictObject({ note: needed("The reason", "Say what is wrong with it.") })
  .meta({ id: "Quarantine" });

export const releaseSchema = z
  .strictObject({ note: needed("The reason", "Say why it may be used again.") })
  .meta({ id: "Release" });

export const supersedeSchema = z
  .strictObject({
    successorId: z.string({ error: "Name the successor by its id." }).min(1, { error: "Name the successor." }).max(100),
    equivalence: z.enum(successorSchema.shape.equivalence.options, {
      error: "The equivalence is dropIn, electricallyEqual or needsRedesign.",
    }),
    note: note.default(""),
  })
  .meta({ id: "Supersession" });
export type Supersession = z.output<typeof supersedeSchema>;

export const withdrawSchema = z
  .strictObject({ note: needed("The reason", "Say why it is withdrawn.") })
  .meta({ id: "Withdrawal" });

export const preferSchema = z
  .strictObject({ preferred: z.boolean({ error: "Say true or false." }), note: note.default("") })
  .meta({ id: "Preference" });
export type Preference = z.output<typeof preferSchema>;
