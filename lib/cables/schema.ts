/**
 * The one description of a cable: zod schemas that validate requests, shape answers and become the OpenAPI
 * document. Units are in the keys; SI on the wire. Pure, runs in the browser too.
 */
import { z } from "zod";
import { provenanceSchema } from "@/lib/cables/provenance";
import { plain } from "@/lib/http/plain-text";

const finite = (what: string) => z.number({ error: `${what} must be a number.` });
export const positive = (what: string) => finite(what).positive({ error: `${what} must be more than 0.` });
export const notNegative = (what: string) => finite(what).nonnegative({ error: `${what} cannot be negative.` });
export const temperature = (what = "The temperature") =>
  finite(what)
    .min(-200, { error: `${what} must be at least −200 °C.` })
    .max(400, { error: `${what} must be at most 400 °C.` });

export const familySchema = z.enum(["coaxial", "twistedPair", "twinaxial"], {
  error: "The family is coaxial, twistedPair or twinaxial.",
});
export type Family = z.infer<typeof familySchema>;

export const stateSchema = z.enum(
  ["draft", "inReview", "approved", "restricted", "quarantined", "superseded", "withdrawn"],
  { error: "The state is draft, inReview, approved, restricted, quarantined, superseded or withdrawn." },
);
export type CableState = z.infer<typeof stateSchema>;

const conductorSchema = z
  .strictObject({
    form: z.enum(["round", "sheet", "sqrt", "constant"], { error: "The form is round, sheet, sqrt or constant." }),
    r0OhmPerM: notNegative("The dc resistance").describe("dc resistance, Ω per metre of cable, at 20 °C"),
    skinCornerRadPerS: positive("The skin corner").optional().describe("rad/s; needed by every form but constant"),
  })
  .refine((term) => term.form === "constant" || term.skinCornerRadPerS !== undefined, {
    path: ["skinCornerRadPerS"],
    error: "This conductor form needs a skin corner.",
  });

/** Ranges that touch are apart; ranges that overlap would count a slope twice. */
function isApart(ranges: { fromC: number; toC: number }[]): boolean {
  const ordered = [...ranges].sort((a, b) => a.fromC - b.fromC);
  return ordered.every(({ fromC }, i) => i === 0 || fromC >= (ordered[i - 1]?.toC ?? -Infinity));
}

export const lineModelSchema = z
  .strictObject({
    conductors: z
      .array(conductorSchema, { error: "Conductors must be a list." })
      .min(1, { error: "At least one conductor term is needed." })
      .max(2, { error: "At most two conductor terms are allowed." }),
    lInfHPerM: positive("The inductance").describe("external (high-frequency) loop inductance, H/m"),
    cFPerM: positive("The capacitance").describe("capacitance at 1 MHz, F/m"),
    lossTangent: notNegative("The loss tangent").max(1, { error: "The loss tangent must be at most 1." }).optional(),
    g0SPerM: notNegative("The leakage").optional().describe("dc leakage conductance, S/m"),
    temperatureCoefficientPerK: finite("The temperature coefficient")
      .optional()
      .describe("per kelvin; default 0.00393"),
    lossSlopes: z
      .array(
        z
          .strictObject({
            fromC: temperature("The start of the range"),
            toC: temperature("The end of the range"),
            perK: finite("The slope"),
          })
          .refine(({ fromC, toC }) => toC > fromC, { path: ["toC"], error: "The range must end above its start." }),
      )
      .max(20, { error: "At most 20 ranges are allowed." })
      .refine(isApart, { error: "Two ranges of loss slopes overlap: each temperature may have one slope." })
      .optional(),
  })
  .meta({ id: "LineModel", description: "One cable per metre at 20 °C; R and L are loop values." });

const figureKinds = ["nominal", "typical", "minimum", "maximum", "measured", "derived"] as const;

export const figureSchema = z
  .strictObject({
    quantity: plain(z.string().min(1).max(60), "The quantity").describe("with its SI unit, as z0Ohm or lossDbPerM"),
    valueSi: finite("The value"),
    asTyped: plain(z.string().max(120), "The figure").describe("as the source gives it, with its unit"),
    kind: z.enum(figureKinds),
    toleranceSi: notNegative("The tolerance").optional(),
    temperatureC: temperature().optional(),
    fromHz: positive("The lower frequency").optional(),
    toHz: positive("The upper frequency").optional(),
    source: plain(z.string().min(1).max(300), "The source"),
    provenance: provenanceSchema.optional().describe("the source in its parts"),
  })
  .meta({ id: "Figure" });
export type Figure = z.infer<typeof figureSchema>;

const coaxSchema = z.strictObject({
  kind: z.literal("coax"),
  innerMm: positive("The inner conductor"),
  dielectricMm: positive("The dielectric"),
  relativePermittivity: positive("The permittivity"),
  lossTangent: notNegative("The loss tangent"),
  conductorResistivityOhmM: positive("The resistivity").optional(),
  strandFactor: positive("The strand factor").optional(),
  braidFactor: positive("The braid factor").optional(),
  shieldThicknessMm: positive("The shield thickness").optional(),
  outerDiameterMm: positive("The outer diameter").optional(),
});

const pairSchema = z.strictObject({
  kind: z.literal("pair"),
  wireMm: positive("The wire"),
  spacingMm: positive("The spacing"),
  effectivePermittivity: positive("The permittivity"),
  lossTangent: notNegative("The loss tangent"),
  layMm: positive("The lay").optional(),
  conductorResistivityOhmM: positive("The resistivity").optional(),
  screen: z.strictObject({ innerMm: positive("The screen's bore") }).optional(),
  outerDiameterMm: positive("The outer diameter").optional(),
});

export const constructionSchema = z
  .discriminatedUnion("kind", [coaxSchema, pairSchema], { error: "The construction is a coax or a pair." })
  .meta({ id: "Construction" });
export type Construction = z.infer<typeof constructionSchema>;

/** What the drawing needs beyond the electrical construction. Each word is drawn, and searched for. */
export const buildSchema = z
  .strictObject({
    conductor: plain(z.string().max(120), "The conductor").describe("inner conductor or wires, in words"),
    isStranded: z.boolean(),
    dielectric: z.enum(["solid", "foam", "airSpaced"]),
    dielectricName: plain(z.string().max(80), "The dielectric"),
    screen: z.array(z.enum(["foil", "braid", "doubleBraid", "strip", "tube", "corrugated", "drain"])).max(4),
    screenName: plain(z.string().max(120), "The screen"),
    jacket: plain(z.string().max(60), "The jacket").nullable().describe("sheath material, null without one"),
    pairCount: z.int().min(1).max(100),
  })
  .meta({ id: "Build" });
export type Build = z.infer<typeof buildSchema>;

export const limitsSchema = z
  .strictObject({
    maxFrequencyHz: positive("The highest frequency").optional(),
    maxVoltageV: positive("The highest voltage").optional(),
    minBendMm: positive("The bend radius").optional(),
    minTemperatureC: temperature("The lowest temperature").optional(),
    maxTemperatureC: temperature("The highest temperature").optional(),
  })
  .meta({ id: "Limits" });
export type Limits = z.infer<typeof limitsSchema>;

export const successorSchema = z.strictObject({
  cableId: z.string(),
  designation: z.string(),
  equivalence: z.enum(["dropIn", "electricallyEqual", "needsRedesign"]),
});

/** A row of the catalogue. */
export const cableItemSchema = z
  .strictObject({
    id: z.string(),
    designation: z.string(),
    aliases: z.array(z.string()),
    name: z.string().describe("what it is, in words"),
    family: familySchema,
    state: stateSchema,
    condition: z.string().nullable().describe("use condition of a restricted entry"),
    preferred: z.boolean(),
    revision: z.int(),
    z0Ohm: z.number(),
    velocityFactor: z.number(),
    capacitanceFPerM: z.number(),
    delaySPerM: z.number(),
    lossDbPer100m: z.number().nullable().describe("at lossAtHz and 20 °C; null when it was not asked for"),
    lossRangeDbPer100m: z.tuple([z.number(), z.number()]).describe("at 10 MHz and 1 GHz"),
    outerDiameterMm: z.number().nullable(),
    construction: constructionSchema.nullable(),
    build: buildSchema.nullable(),
    usedInRuns: z.int(),
  })
  .meta({ id: "CableItem" });
export type CableItem = z.infer<typeof cableItemSchema>;

/** One cable, its current revision whole. */
export const cableSchema = z
  .strictObject({
    id: z.string(),
    designation: z.string(),
    aliases: z.array(z.string()),
    name: z.string(),
    family: familySchema,
    state: stateSchema,
    condition: z.string().nullable(),
    preferred: z.boolean(),
    revision: z.int(),
    model: lineModelSchema,
    construction: constructionSchema.nullable(),
    build: buildSchema.nullable(),
    figures: z.array(figureSchema),
    limits: limitsSchema,
    successor: successorSchema.nullable(),
  })
  .meta({ id: "Cable" });
export type Cable = z.infer<typeof cableSchema>;
