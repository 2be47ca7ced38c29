/**
 * What a file is, by its content: a name or a header can say anything. Only kinds that cannot run in a browser. Pure.
 */
import { isTable, isText, isTouchstone } from "@/lib/cables/evidence/text-kinds";

export const evidenceTypes = [
  "application/pdf",
  "image/png",
  "image/jpeg",
  "image/webp",
  "application/touchstone",
  "text/csv",
] as const;
export type EvidenceType = (typeof evidenceTypes)[number];

const latin = (bytes: Uint8Array, from: number, to: number) =>
  Array.from(bytes.subarray(Math.max(0, from), to), (byte) => String.fromCharCode(byte)).join("");

const startsWith = (bytes: Uint8Array, ...starts: number[]) => starts.every((byte, i) => bytes[i] === byte);
const wordAt = (bytes: Uint8Array, at: number) => new DataView(bytes.buffer, bytes.byteOffset).getUint32(at, true);

/** ISO 32000-2, 7.5: the header at the start, and at the end where the cross-reference begins, with its mark. */
function isPdf(bytes: Uint8Array): boolean {
  if (!/^%PDF-[12]\.\d/.test(latin(bytes, 0, 8))) return false;
  const end = latin(bytes, bytes.length - 2048, bytes.length);
  return /startxref\s+\d+\s+%%EOF\s*\0*$/.test(end);
}

/** W3C PNG, 5.2: signature, IHDR first, IEND last. */
function isPng(bytes: Uint8Array): boolean {
  if (!startsWith(bytes, 0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)) return false;
  return latin(bytes, 12, 16) === "IHDR" && latin(bytes, bytes.length - 8, bytes.length - 4) === "IEND";
}

/** ITU-T T.81, annex B: start of image, a marker, end of image. */
function isJpeg(bytes: Uint8Array): boolean {
  return startsWith(bytes, 0xff, 0xd8, 0xff) && latin(bytes, bytes.length - 2, bytes.length) === "\u00ff\u00d9";
}

/** RFC 9649: a RIFF container of the kind WEBP that is as long as it says. */
function isWebp(bytes: Uint8Array): boolean {
  if (bytes.length < 16 || latin(bytes, 0, 4) !== "RIFF" || latin(bytes, 8, 12) !== "WEBP") return false;
  const size = wordAt(bytes, 4) + 8;
  return size === bytes.length || size + 1 === bytes.length;
}

/** @returns undefined for anything that is not kept as evidence */
export function typeByContent(bytes: Uint8Array): EvidenceType | undefined {
  if (isPdf(bytes)) return "application/pdf";
  if (isPng(bytes)) return "image/png";
  if (isJpeg(bytes)) return "image/jpeg";
  if (isWebp(bytes)) return "image/webp";
  if (!isText(bytes)) return undefined;
  if (isTouchstone(bytes)) return "application/touchstone";
  return isTable(bytes) ? "text/csv" : undefined;
}

/** Whether a browser may show it in its own page rather than keep it. */
export function mayBeShown(type: string): boolean {
  return type.startsWith("image/") || type === "application/pdf";
}
