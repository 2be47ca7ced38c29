/** A lot as it comes over HTTP: JSON, or a form with the file it was measured in. */
import { newLotSchema, type NewLot } from "@/lib/cables/lots/schema";
import { mediaTypeOf, readJson } from "@/lib/http/body";
import { AppError } from "@/lib/http/errors";
import { readForm, type Upload } from "@/lib/http/form";
import { parse } from "@/lib/http/parse";

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    throw new AppError("malformed", "The field lot is not JSON.");
  }
}

/** @throws AppError as `readJson` and `readForm` */
export async function receiveLot(request: Request): Promise<{ lot: NewLot; file?: Upload }> {
  if (mediaTypeOf(request) !== "multipart/form-data") return { lot: await readJson(request, newLotSchema) };
  const { file, fields } = await readForm(request);
  return { lot: parse(newLotSchema, jsonOf(fields.lot ?? "")), file };
}
