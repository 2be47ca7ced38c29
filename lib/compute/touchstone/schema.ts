/** What `/compute/touchstone` is asked and answers. Pure. */
import { z } from "zod";

/** Most characters of a file's text: 25 MB. */
export const mostFileCharacters = 25 * 1_048_576;
/** Room for the text of the largest file as JSON, its line ends escaped. */
export const mostTouchstoneBytes = 30 * 1_048_576;

export const touchstoneRequestSchema = z
  .strictObject({
    fileName: z
      .string({ error: "The file's name is needed." })
      .min(1, { error: "The file's name is needed." })
      .max(255, { error: "A file's name has at most 255 characters." })
      .describe("its extension, .s2p, tells the ports of a file of version 1"),
    text: z.string({ error: "The file's text is needed." }).describe("the whole file; at most 25 MB"),
  })
  .meta({ id: "TouchstoneRequest" });
export type TouchstoneRequest = z.output<typeof touchstoneRequestSchema>;

const matrices = z.array(z.array(z.array(z.number()))).describe("[k][i][j]: frequency, row, column");
const figures = z.array(z.number());

export const touchstoneAnswerSchema = z
  .strictObject({
    version: z.enum(["1.1", "2.0", "2.1"]),
    ports: z.int(),
    parameter: z.enum(["S", "Y", "Z"]),
    referenceOhm: figures.describe("one a port"),
    frequenciesHz: figures,
    matrix: z.strictObject({ re: matrices, im: matrices }).describe("S without unit, Z in Ω, Y in S"),
    comments: z.array(z.string()),
    warnings: z
      .array(z.strictObject({ line: z.int().nullable(), message: z.string() }))
      .describe("what was odd, and how it was understood"),
    noise: z
      .strictObject({
        frequenciesHz: figures,
        minimumFigureDb: figures,
        reflection: z.strictObject({ re: figures, im: figures }),
        resistanceOhm: figures,
      })
      .optional(),
  })
  .meta({ id: "TouchstoneAnswer" });
export type TouchstoneAnswer = z.infer<typeof touchstoneAnswerSchema>;
