/**
 * Reads files of network parameters (Touchstone 1.1, 2.0 and 2.1): strictly, every refusal with its line, every oddity
 * with a word on how it was understood. One pass over the text; memory grows with what is kept, not with the lines.
 * Source: Touchstone File Format Specification, IBIS Open Forum, versions 1.1, 2.0 and 2.1.
 */
import { Lines } from "@/lib/touchstone/lines";
import { FileFault, type FileLimits, type NetworkFile, usualFileLimits } from "@/lib/touchstone/network-file";
import { readVersion1 } from "@/lib/touchstone/version-1";
import { readVersion2 } from "@/lib/touchstone/version-2";

/** The ports a name tells, as in run.s2p; null where it tells none. */
function portsOfName(fileName: string, { ports: most }: FileLimits): number | null {
  const [, digits] = /\.s(\d{1,4})p$/i.exec(fileName.trim()) ?? [];
  if (digits === undefined) return null;
  const ports = Number(digits);
  if (ports < 1 || ports > most) throw new FileFault(null, `The name says ${ports} ports; 1 to ${most} are read.`);
  return ports;
}

/**
 * @param fileName - its extension tells the ports of a file of version 1
 * @param text - the whole file
 * @param limits - what it may hold at most
 * @throws FileFault with the line (from 1, null if no single one is at fault) and what is wrong; nothing else
 */
export function readNetworkFile(fileName: string, text: string, limits: FileLimits = usualFileLimits): NetworkFile {
  const named = portsOfName(fileName, limits);
  const lines = new Lines(text);
  if (!lines.nextWithContent()) throw new FileFault(null, "There is no option line and there are no data.");
  return text.charAt(lines.start) === "[" ? readVersion2(lines, named, limits) : readVersion1(lines, named, limits);
}
