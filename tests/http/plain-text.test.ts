import { expect, test } from "vitest";
import { newRunSchema } from "@/lib/runs/schema";
import { newCableCommentSchema } from "@/lib/cables/comments/schema";
import { newReportSchema } from "@/lib/cables/reports/schema";
import { newRevisionSchema } from "@/lib/cables/revisions/schema";
import { buildSchema, figureSchema } from "@/lib/cables/schema";
import { restrictSchema, returnSchema } from "@/lib/cables/steps/schema";
import { isPlainText } from "@/lib/http/plain-text";

test.each([
  "50 Ω thin hook-up coax",
  "Übersee, mast 2\nsecond line",
  "Ελλάδα",
  "日本語",
  "עברית",
  "naïve – “quoted” 😀",
])("%s is text that shows all it holds", (text) => expect(isPlainText(text)).toBe(true));

test.each([
  ["a null", "a\u0000b"],
  ["an escape", "a\u001b[31mb"],
  ["a mark that turns direction", "C50\u202e01F"],
  ["an isolate", "a\u2066b"],
  ["a line separator", "a\u2028b"],
  ["half a character", "a\ud800b"],
])("%s in a name is refused with a sentence", (_, name) => {
  const circuit = { source: { kind: "constant", reOhm: 50, imOhm: 0 }, elements: [], load: { kind: "open" } };
  const { error } = newRunSchema.safeParse({ name, circuit });
  expect(error?.issues).toMatchObject([
    { path: ["name"], message: "The name holds characters that cannot be seen; type it anew." },
  ]);
});

const turned = "50 \u202e05";
test.each([
  ["a comment", newCableCommentSchema, { text: turned }],
  ["a report", newReportSchema, { text: turned }],
  ["why there is a revision", newRevisionSchema, { reason: turned }],
  ["a condition", restrictSchema, { condition: turned }],
  ["what has to change", returnSchema, { note: turned }],
  [
    "a figure as typed",
    figureSchema,
    { quantity: "z0Ohm", valueSi: 50, asTyped: turned, kind: "nominal", source: "x" },
  ],
  ["a word of the build", buildSchema.pick({ jacket: true }), { jacket: turned }],
])("%s refuses characters that cannot be seen: a reviewer reads what is kept", (_, schema, given) => {
  expect(schema.safeParse(given).error?.issues).toMatchObject([{ message: expect.stringContaining("cannot be seen") }]);
});
