/** What may stand in a letter. Pure. */

/** Line ends, tabs, marks of direction, and every other character that steers something rather than being read. */
const steering = /[\p{Cc}\p{Zl}\p{Zp}\p{Bidi_Control}]+/gu;

/** Halves of characters, which no encoding can write. */
const halves = /\p{Cs}/gu;

function cut(text: string, most: number): string {
  const characters = [...text.replaceAll(halves, "\uFFFD")];
  return characters.length <= most ? characters.join("") : `${characters.slice(0, most - 1).join("")}…`;
}

/**
 * A text as one line, so that nothing in it can begin a header or a line of its own.
 * @param most - characters kept; a longer text ends in …
 */
export function oneLine(text: string, most: number): string {
  return cut(text.replaceAll(steering, " ").replaceAll(/ {2,}/g, " ").trim(), most);
}

/**
 * A text of several lines: line ends as ours, and no other character that steers something.
 * @param most - characters kept; a longer text ends in …
 */
export function plainText(text: string, most: number): string {
  return cut(text.replaceAll(/\r\n?|[\u2028\u2029]/g, "\n").replaceAll(/[^\P{Cc}\n\t]/gu, ""), most);
}

/**
 * Whether a text is one mail address and nothing more: no list, no name, no comment, no line end. Narrower than
 * RFC 5321 section 4.1.2, which also knows quoted local parts and address literals.
 */
export function isMailAddress(text: string): boolean {
  return text.length <= 254 && /^[^\s@<>()[\]\\,;:"\p{C}]+@[^\s@<>()[\]\\,;:"\p{C}]+$/u.test(text);
}
