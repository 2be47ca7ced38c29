/** The file of an import as it comes over HTTP. */
import { fileTooLarge, mediaTypeOf, mostFileBytes, readBytes } from "@/lib/http/body";
import type { ImportQuery } from "@/lib/cables/imports/schema";
import type { ImportFile } from "@/lib/cables/imports/service";
import { withoutStrange } from "@/lib/cables/exchange/plain-text";
import { AppError } from "@/lib/http/errors";

const kinds: Record<string, "csv" | "json" | undefined> = {
  "text/csv": "csv",
  "text/tab-separated-values": "csv",
  "application/json": "json",
};

const tooLarge = `${fileTooLarge} Part it: GET /cables/export takes after and limit.`;

/** @throws AppError `unsupported_media_type`, `too_large`, `malformed` where nothing was sent */
export async function receiveImport(request: Request, query: ImportQuery): Promise<ImportFile> {
  const as = kinds[mediaTypeOf(request) ?? ""];
  if (!as) throw new AppError("unsupported_media_type", "Send a table as text/csv or a catalogue as application/json.");
  const packing = request.headers.get("content-encoding");
  if (packing !== null && packing !== "identity")
    throw new AppError("unsupported_media_type", "Send the file as it is, not compressed.");
  const bytes = await readBytes(request, mostFileBytes, tooLarge);
  if (bytes.byteLength === 0) throw new AppError("malformed", "The file is empty.");
  const charset = /charset="?([\w-]+)/i.exec(request.headers.get("content-type") ?? "")?.[1];
  const fileName = withoutStrange(query.fileName ?? `catalogue.${as}`).replace(/[\r\n\t]/g, " ");
  return { bytes, as, charset, fileName, family: query.family, isDryRun: query.dryRun ?? false };
}
