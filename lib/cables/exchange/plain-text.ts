/** Characters that are not seen, or that make a text look like another: not in a catalogue. Pure. */

const kinds: { what: string; pattern: RegExp }[] = [
  { what: "a control character", pattern: /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f]/g },
  { what: "a mark that turns the direction of text", pattern: /[\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]/g },
  { what: "a character that is not seen", pattern: /[\u00ad\u200b-\u200d\u2060-\u2064\ufeff\ufff9-\ufffb]/g },
  { what: "half a character", pattern: /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g },
];
const lineBreak = { what: "a line break", pattern: /[\t\r\n\u2028\u2029]/g };

/** All of them at once: most texts hold none, and are looked through once. */
const any = new RegExp(kinds.map(({ pattern }) => pattern.source).join("|"));

/** What of such is in a text, in words; undefined where there is nothing of it. */
export function strangeIn(text: string, isOneLine = true): string | undefined {
  if (any.test(text)) return kinds.find(({ pattern }) => text.search(pattern) >= 0)?.what;
  return isOneLine && text.search(lineBreak.pattern) >= 0 ? lineBreak.what : undefined;
}

/** The text without it. */
export function withoutStrange(text: string): string {
  return kinds.reduce((rest, { pattern }) => rest.replace(pattern, ""), text);
}

/** Whether any text inside a value holds such. */
function holdsStrange(value: unknown): boolean {
  if (typeof value === "string") return any.test(value);
  if (typeof value !== "object" || value === null) return false;
  for (const key in value) if (holdsStrange((value as Record<string, unknown>)[key])) return true;
  return false;
}

/**
 * Every text inside a value cleaned.
 * @param cleaned - told what was taken out, once for each text that held something
 */
export function cleanedTexts(value: unknown, cleaned: (what: string) => void): unknown {
  return holdsStrange(value) ? cleanedInside(value, cleaned) : value;
}

function cleanedInside(value: unknown, cleaned: (what: string) => void): unknown {
  if (typeof value === "string") {
    const what = strangeIn(value, false);
    if (what === undefined) return value;
    cleaned(what);
    return withoutStrange(value);
  }
  if (Array.isArray(value)) return value.map((each) => cleanedInside(each, cleaned));
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, each]) => [key, cleanedInside(each, cleaned)]));
}
