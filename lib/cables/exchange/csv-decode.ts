/** The bytes of a file -> its text, by the encoding it is in; what cannot be a table is refused by its name. Pure. */

export interface Decoded {
  text: string;
  /** how the bytes were read */
  encoding: "UTF-8" | "UTF-16" | "Windows-1252";
}

/** Files that people send for a CSV, by how they start. */
const otherFiles: { starts: number[]; what: string }[] = [
  { starts: [0x50, 0x4b, 0x03, 0x04], what: "a workbook or another zip file; save the sheet as CSV" },
  { starts: [0xd0, 0xcf, 0x11, 0xe0], what: "an old workbook; save the sheet as CSV" },
  { starts: [0x1f, 0x8b], what: "compressed; unpack it first" },
  { starts: [0x25, 0x50, 0x44, 0x46], what: "a PDF; type or export its table as CSV" },
  { starts: [0x89, 0x50, 0x4e, 0x47], what: "a picture" },
  { starts: [0xff, 0xd8, 0xff], what: "a picture" },
  { starts: [0x42, 0x5a, 0x68], what: "compressed; unpack it first" },
  { starts: [0x37, 0x7a, 0xbc, 0xaf], what: "compressed; unpack it first" },
];

const startsWith = (bytes: Uint8Array, starts: readonly number[]) => starts.every((byte, i) => bytes[i] === byte);

/** Windows-1252 leaves these undefined, and no text holds control characters: bytes that are neither are no Latin text. */
const notLatin = /[\u0000-\u0008\u000e-\u001f\u007f\u0081\u008d\u008f\u0090\u009d]/;

function decode(bytes: Uint8Array, label: string): string | undefined {
  try {
    return new TextDecoder(label, { fatal: true }).decode(bytes);
  } catch {
    return undefined;
  }
}

/**
 * @param charset - what the sender said, if anything
 * @throws RangeError what the file is, where it is no text that can be told
 */
export function decodeTable(bytes: Uint8Array, charset?: string): Decoded {
  const other = otherFiles.find(({ starts }) => startsWith(bytes, starts));
  if (other) throw new RangeError(`decodeTable: The file is ${other.what}.`);
  const wide = startsWith(bytes, [0xff, 0xfe]) ? "utf-16le" : startsWith(bytes, [0xfe, 0xff]) ? "utf-16be" : undefined;
  if (wide) {
    const text = decode(bytes, wide);
    if (text === undefined)
      throw new RangeError("decodeTable: The file begins as UTF-16, but is not UTF-16 throughout.");
    return { text, encoding: "UTF-16" };
  }
  if (bytes.subarray(0, 4096).includes(0))
    throw new RangeError(
      "decodeTable: The file holds NUL bytes: UTF-16 without its mark, or no text. Save it as UTF-8.",
    );
  const isLatinSaid = charset !== undefined && /^(iso-8859-1|latin-?1|windows-1252|cp1252)$/i.test(charset);
  const utf8 = isLatinSaid ? undefined : decode(bytes, "utf-8");
  if (utf8 !== undefined) return { text: utf8, encoding: "UTF-8" };
  const latin = decode(bytes, "windows-1252");
  if (latin === undefined || notLatin.test(latin))
    throw new RangeError("decodeTable: The file is neither UTF-8, UTF-16 nor Latin-1. Save it as UTF-8.");
  return { text: latin, encoding: "Windows-1252" };
}
