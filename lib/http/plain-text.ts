/** Text that shows all it holds. Pure. */
import type { z } from "zod";

/** Control characters but tab and line end, and marks that turn the direction of what follows; half a character is none. */
const unseen = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069]/;
const half = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/;

export function isPlainText(text: string): boolean {
  return !unseen.test(text) && !half.test(text);
}

/** A schema of text that refuses characters nobody sees: a name must not read differently from what it is. */
export function plain(schema: z.ZodString, what: string): z.ZodString {
  return schema.refine(isPlainText, { error: `${what} holds characters that cannot be seen; type it anew.` });
}
