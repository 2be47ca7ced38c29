/** Reading a request's body: JSON of at most 1 MB unless the operation takes more, a file of at most 25. */
import type { z } from "zod";
import { AppError } from "@/lib/http/errors";
import { parse } from "@/lib/http/parse";

export const mostBodyBytes = 1_048_576;

/** A file that is sent in. */
export const mostFileBytes = 25 * mostBodyBytes;
export const fileTooLarge = "A file has at most 25 MB.";

const bodyTooLarge = (most: number) => `A body has at most ${Math.round(most / mostBodyBytes)} MB.`;

/**
 * The body's bytes, counted while they come: what is longer is not read to its end.
 * @throws AppError `too_large` with the sentence
 */
export async function readBytes(request: Request, most: number, sentence: string): Promise<Uint8Array<ArrayBuffer>> {
  const tooLarge = () => new AppError("too_large", sentence);
  if (Number(request.headers.get("content-length")) > most) throw tooLarge();
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  for (let step = await reader?.read(); step && !step.done; step = await reader?.read()) {
    size += step.value.byteLength;
    if (size > most) {
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

/** The media type of a body, lower case, without parameters; undefined where none is said. */
export function mediaTypeOf(request: Request): string | undefined {
  return request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase();
}

/**
 * The request's JSON as the schema reads it.
 * @param mostBytes - of the body as it is sent
 * @throws AppError `unsupported_media_type`, `too_large`, `malformed`, or `invalid_input` with every field that is wrong
 */
export async function readJson<Schema extends z.ZodType>(
  request: Request,
  schema: Schema,
  mostBytes = mostBodyBytes,
): Promise<z.output<Schema>> {
  if (mediaTypeOf(request) !== "application/json")
    throw new AppError("unsupported_media_type", "Send JSON, with Content-Type: application/json.");
  return parse(schema, parseJson(await readBytes(request, mostBytes, bodyTooLarge(mostBytes))));
}
