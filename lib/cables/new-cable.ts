/** What a new entry is given. Pure. */
import { z } from "zod";
import {
  buildSchema,
  constructionSchema,
  familySchema,
  figureSchema,
  limitsSchema,
  lineModelSchema,
} from "@/lib/cables/schema";
import { plain } from "@/lib/http/plain-text";

/** A new entry: it starts as its author's draft. */
export const newCableSchema = z
  .strictObject({
    designation: plain(
      z
        .string({ error: "The designation must be text." })
        .trim()
        .min(1, { error: "Give the cable a designation." })
        .max(40, { error: "A designation has at most 40 characters." }),
      "The designation",
    ),
    aliases: z
      .array(plain(z.string().trim().min(1).max(60, { error: "An alias has at most 60 characters." }), "An alias"))
      .max(20, { error: "An entry has at most 20 aliases." })
      .default([]),
    name: plain(z.string().trim().max(120, { error: "A name has at most 120 characters." }), "The name").default(""),
    family: familySchema,
    model: lineModelSchema,
    construction: constructionSchema.nullable().default(null),
    build: buildSchema.nullable().default(null),
    figures: z.array(figureSchema).max(200, { error: "An entry has at most 200 figures." }).default([]),
    limits: limitsSchema.default({}),
  })
  .meta({ id: "NewCable" });
export type NewCable = z.infer<typeof newCableSchema>;
