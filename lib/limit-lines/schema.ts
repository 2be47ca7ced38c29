/** Limit lines on the wire: those of the standards and a team's own. Pure, runs in the browser too. */
import { z } from "zod";
import { positive } from "@/lib/cables/schema";
import { plain } from "@/lib/http/plain-text";
import { checkLine } from "@/lib/limit-lines/check-line";

export const limitQuantitySchema = z.enum(["insertionLoss", "returnLoss", "delay", "skew", "dcLoop", "conductorDc"], {
  error: "A limit is of insertionLoss, returnLoss, delay, skew, dcLoop or conductorDc.",
});
export const limitOfSchema = z.enum(["cable", "link", "channel", "segment"], {
  error: "A limit is of a cable, link, channel or segment.",
});

const mostPieces = 20;
const mostPoints = 500;

const frequencyHz = (what: string) =>
  positive(what)
    .min(1e-3, { error: `${what} is at least 0.001 Hz.` })
    .max(1e12, { error: `${what} is at most 1 THz.` });
const coefficient = z
  .number({ error: "A coefficient is a number." })
  .min(-1e6, { error: "A coefficient is at least −1 000 000." })
  .max(1e6, { error: "A coefficient is at most 1 000 000." })
  .optional();

const pieceSchema = z
  .strictObject({
    ...{ fromHz: frequencyHz("The lowest frequency"), toHz: frequencyHz("The highest frequency") },
    ...{ k0: coefficient, k1: coefficient, k2: coefficient, k3: coefficient, kLog: coefficient },
  })
  .refine(({ fromHz, toHz }) => !(toHz < fromHz), {
    path: ["toHz"],
    error: "A range does not end below where it begins.",
  })
  .describe("k0 + k1·√x + k2·x + k3/√x + kLog·log₁₀x, x = frequency/referenceHz, in dB, s or Ω; an absent one is 0");

const formulaSchema = z.strictObject({
  form: z.literal("formula"),
  referenceHz: frequencyHz("The reference").describe("1e6 where the formula counts in megahertz"),
  pieces: z
    .array(pieceSchema, { error: "The pieces are a list." })
    .min(1, { error: "A formula has at least one piece." })
    .max(mostPieces, { error: `A formula has at most ${mostPieces} pieces.` })
    .describe("ascending, none over another"),
});

const pointsSchema = z.strictObject({
  form: z.literal("points"),
  points: z
    .array(z.strictObject({ frequencyHz: frequencyHz("A frequency"), value: positive("A limit") }), {
      error: "The points are a list.",
    })
    .min(2, { error: "A line has at least two points." })
    .max(mostPoints, { error: `A line has at most ${mostPoints} points.` })
    .describe("ascending; straight over the logarithm of frequency in between; value in dB, s or Ω"),
});

const constantSchema = z.strictObject({ form: z.literal("constant"), value: positive("The limit") });

export const limitCurveSchema = z
  .discriminatedUnion("form", [formulaSchema, pointsSchema, constantSchema], {
    error: "A curve is a formula, points or a constant.",
  })
  .meta({ id: "LimitCurve" });

const text = (what: string, most: number) =>
  plain(
    z
      .string({ error: `${what} must be text.` })
      .trim()
      .max(most, { error: `${what} has at most ${most} characters.` }),
    what,
  );
const needed = (what: string, most: number) =>
  text(what, most).refine((given) => given !== "", { error: `${what} is needed.` });

const sourceSchema = z.strictObject({
  title: needed("The title", 120).describe("of the standard, specification or house rule it is taken from"),
  edition: needed("The edition", 60),
  clause: text("The clause", 60).nullable().default(null).describe("clause or table; null where it was not seen"),
});

const lineFields = {
  name: needed("The name", 80),
  quantity: limitQuantitySchema.describe("returnLoss at least, the others at most"),
  of: limitOfSchema,
  perLengthM: positive("The length")
    .max(1e5, { error: "The length is at most 100 km." })
    .optional()
    .describe("the line is for this length and grows with it; absent: for the whole, whatever its length"),
  curve: limitCurveSchema,
  source: sourceSchema,
  note: text("The note", 500).default(""),
};

export const newLimitLineSchema = z
  .strictObject(lineFields)
  .superRefine(checkLine)
  .meta({ id: "NewLimitLine", description: "The quantity in dB, s or Ω." });
export type NewLimitLine = z.infer<typeof newLimitLineSchema>;

export const limitLineSchema = z
  .strictObject({
    id: z.string(),
    ...lineFields,
    isStandard: z.boolean().describe("of a standard, and not the team's to take away"),
    mark: z
      .enum(["seen", "quoted", "memory"])
      .nullable()
      .describe(
        "how we know a standard's line: its page was seen, it was quoted in another work, or recalled: check your edition",
      ),
    addedByName: z.string().nullable(),
    addedAt: z.string().nullable().describe("ISO 8601"),
  })
  .meta({ id: "LimitLine" });
export type LimitLineItem = z.infer<typeof limitLineSchema>;

export const limitLineQuerySchema = z.strictObject({
  quantity: limitQuantitySchema.optional().describe("default all"),
  of: limitOfSchema.optional().describe("default all"),
});
export type LimitLineQuery = z.output<typeof limitLineQuerySchema>;

export const limitLinesSchema = z
  .strictObject({ items: z.array(limitLineSchema) })
  .meta({ id: "LimitLines", description: "Those of the standards first, then the team's own by name." });
