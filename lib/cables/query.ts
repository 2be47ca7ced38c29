/** What `GET /cables` is asked and answers. Pure. */
import { z } from "zod";
import { cableItemSchema, familySchema, stateSchema } from "@/lib/cables/schema";
import { nextCursorSchema, pageFields } from "@/lib/http/list";

const decimal = String.raw`[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d{1,3})?`;
const rangePattern = new RegExp(`^(${decimal})?\\.\\.(${decimal})?$`);

/** A range with one end or both; an absent end does not bind. */
export interface Range {
  from?: number;
  to?: number;
}

const range = (what: string) =>
  z
    .string({ error: `${what} is given once.` })
    .transform((text, context): Range => {
      const match = rangePattern.exec(text.trim());
      const from = match?.[1] === undefined ? undefined : Number(match[1]);
      const to = match?.[2] === undefined ? undefined : Number(match[2]);
      const isRead =
        match !== null && (from ?? to) !== undefined && Number.isFinite(from ?? 0) && Number.isFinite(to ?? 0);
      const message = !isRead
        ? `${what} is a range like 45..55, 45.. or ..55.`
        : from !== undefined && to !== undefined && from > to
          ? `${what} has its lower end above its upper end.`
          : undefined;
      if (message === undefined) return { from, to };
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    })
    .optional()
    .describe("a range: 45..55, 45.. or ..55");

const frequency = (what: string) =>
  z
    .string({ error: `${what} is given once.` })
    .trim()
    .regex(new RegExp(`^${decimal}$`), { error: `${what} is a number of hertz.` })
    .transform(Number)
    .pipe(z.number({ error: `${what} is too large.` }).positive({ error: `${what} must be more than 0.` }))
    .optional();

const flag = z.enum(["true", "false"], { error: "This is true or false." }).transform((text) => text === "true");
const several = <T extends z.ZodType>(one: T) =>
  z.preprocess((given) => (Array.isArray(given) ? given : [given]), z.array(one)).optional();

export const sortKeys = ["relevance", "designation", "z0", "loss", "velocityFactor", "outerDiameter"] as const;
export type SortKey = (typeof sortKeys)[number];
const sorts = [...sortKeys, ...sortKeys.map((key) => `-${key}` as const)] as const;

export const cableQuerySchema = z
  .strictObject({
    q: z
      .string({ error: "The search is given once." })
      .trim()
      .max(200, { error: "A search has at most 200 characters." })
      .optional(),
    exact: flag.optional().describe("true takes every word of the search as typed"),
    family: several(familySchema).describe("repeatable"),
    z0Ohm: range("The impedance"),
    velocityFactor: range("The velocity factor"),
    outerDiameterMm: range("The outer diameter"),
    lossDbPer100m: range("The loss").describe("a range: 2..6, 2.. or ..6, at lossAtHz"),
    lossAtHz: frequency("The frequency of the loss"),
    maxFrequencyHz: frequency("The highest frequency").describe("entries rated at least this high"),
    state: several(stateSchema).describe("repeatable; default approved, which includes restricted ones, marked"),
    preferred: flag.optional(),
    sort: z
      .enum(sorts, { error: `The sort is one of ${sortKeys.join(", ")}, with a leading - to reverse.` })
      .optional(),
    facets: flag.optional(),
    ...pageFields,
  })
  .refine(
    (query) => query.lossAtHz !== undefined || (query.lossDbPer100m === undefined && !query.sort?.endsWith("loss")),
    {
      path: ["lossAtHz"],
      error: "A loss needs the frequency it is meant at.",
    },
  );
export type CableQuery = z.output<typeof cableQuerySchema>;

const histogramSchema = z.array(z.strictObject({ from: z.number(), to: z.number(), count: z.int() }));
const valuesSchema = <T extends z.ZodType>(value: T) => z.array(z.strictObject({ value, count: z.int() }));

export const facetsSchema = z
  .strictObject({
    z0Ohm: histogramSchema,
    velocityFactor: histogramSchema,
    lossDbPer100m: histogramSchema.describe("empty without lossAtHz"),
    outerDiameterMm: histogramSchema,
    family: valuesSchema(familySchema),
    state: valuesSchema(stateSchema),
  })
  .meta({
    id: "CableFacets",
    description: "For each filter, how many entries each value has under all the other filters.",
  });
export type Facets = z.infer<typeof facetsSchema>;

export const looseningSchema = z.strictObject({
  without: z.string().describe("the words left out, as typed"),
  q: z.string().describe("the search without them"),
  count: z.int(),
});
export type Loosening = z.infer<typeof looseningSchema>;

export const cablePageSchema = z
  .strictObject({
    items: z.array(cableItemSchema),
    nextCursor: nextCursorSchema,
    total: z.int(),
    outOf: z.int().describe("entries of the catalogue there are to read, whatever is asked"),
    readAs: z.string().optional().describe("how the search was read"),
    corrected: z
      .array(z.strictObject({ typed: z.string(), read: z.string() }))
      .optional()
      .describe("words of the search that were read as others"),
    loosenings: z
      .array(looseningSchema)
      .optional()
      .describe("only where nothing is found: nearby searches that do find"),
    facets: facetsSchema.optional(),
  })
  .meta({ id: "CablePage" });
export type CablePage = z.infer<typeof cablePageSchema>;
