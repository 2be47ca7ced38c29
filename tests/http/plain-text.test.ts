import { expect, test } from "vitest";
import { newRunSchema } from "@/lib/runs/schema";
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
