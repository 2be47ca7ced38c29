/** Reading a request's body: JSON of at most 1 MB. */
import type { z } from "zod";
import { AppError } from "@/lib/http/errors";
import { parse } from "@/lib/http/parse";

export const mostBodyBytes = 1_048_576;

const tooLarge = () => new AppError("too_large", "A body has at most 1 MB.");

async function readBytes(request: Request): Promise<Uint8Array> {
  if (Number(request.headers.get("content-length")) > mostBodyBytes) throw tooLarge();
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  for (let step = await reader?.read(); step && !step.done; step = await reader?.read()) {
    size += step.value.byteLength;
    if (size > mostBodyBytes) {
      await reader?.cancel();
      throw tooLarge();
    }
    chunks.push(step.value);
  }
  return Buffer.concat(chunks);
}

function parseJson(bytes: Uint8Array): unknown {
  try {
    return JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(bytes));
  } catch {
    throw new AppError("malformed", "The body is not JSON in UTF-8.");
  }
}

/**
 * The request's JSON as the schema reads it.
 * @throws AppError `unsupported_media_type`, `too_large`, `malformed`, or `invalid_input` with every field that is wrong
 */
export async function readJson<Schema extends z.ZodType>(request: Request, schema: Schema): Promise<z.output<Schema>> {
  const mediaType = request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase();
  if (mediaType !== "application/json")
    throw new AppError("unsupported_media_type", "Send JSON, with Content-Type: application/json.");
  return parse(schema, parseJson(await readBytes(request)));
}
