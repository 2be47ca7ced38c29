/** Reading a form with a file: counted while it comes, so that what is too long is not read to its end. */
import { AppError } from "@/lib/http/errors";
import { fileTooLarge, mediaTypeOf, mostFileBytes, readBytes } from "@/lib/http/body";

/** What a form's own lines and fields may take beside its file. */
const mostAround = 64 * 1024;
/** Many small parts would take seconds to read. */
const mostParts = 50;

function hasTooManyParts(bytes: Uint8Array<ArrayBuffer>, contentType: string): boolean {
  const boundary = /boundary="?([^";]+)/i.exec(contentType)?.[1] ?? "";
  const line = `\r\n--${boundary}`;
  const body = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  let count = 0;
  for (let at = body.indexOf(line); at >= 0 && count <= mostParts; at = body.indexOf(line, at + line.length)) count++;
  return count > mostParts;
}

export interface Upload {
  fileName: string;
  bytes: Uint8Array<ArrayBuffer>;
}

export interface ReadForm {
  file: Upload | undefined;
  fields: Record<string, string>;
}

async function parsed(bytes: Uint8Array<ArrayBuffer>, contentType: string): Promise<FormData> {
  try {
    return await new Response(bytes, { headers: { "Content-Type": contentType } }).formData();
  } catch {
    throw new AppError(
      "malformed",
      "The form cannot be read: it is cut short, or its parts are not parted as it says.",
    );
  }
}

/** The last part of a path in any way of writing it, without what a file system or a header could stumble over. */
export function plainFileName(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? "";
  const plain = last
    .replace(/[\u0000-\u001f\u007f-\u009f\u00ad\u061c\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff<>:"|?*]/g, "")
    .trim();
  // By whole characters: a half one would be a name that nothing can write.
  return (
    Array.from(
      plain
        .slice(-300)
        .replace(/^[\udc00-\udfff]/, "")
        .replace(/^\.+/, ""),
    )
      .slice(-120)
      .join("") || "file"
  );
}

/**
 * @param fileField - name of the one field that holds a file
 * @throws AppError `unsupported_media_type`, `too_large`, `malformed`; `invalid_input` for a second file
 */
export async function readForm(request: Request, fileField = "file"): Promise<ReadForm> {
  const contentType = request.headers.get("content-type") ?? "";
  if (mediaTypeOf(request) !== "multipart/form-data")
    throw new AppError("unsupported_media_type", "Send a form, with Content-Type: multipart/form-data.");
  const sent = await readBytes(request, mostFileBytes + mostAround, fileTooLarge);
  if (hasTooManyParts(sent, contentType)) throw new AppError("too_large", `A form has at most ${mostParts} parts.`);
  const form = await parsed(sent, contentType);
  const read: ReadForm = { file: undefined, fields: {} };
  for (const [name, value] of form) {
    if (typeof value === "string") {
      if (name !== "__proto__") read.fields[name] = value;
      continue;
    }
    if (name !== fileField || read.file)
      throw new AppError("invalid_input", "One file at a time.", { [name]: [`One file, in the field ${fileField}.`] });
    const bytes = new Uint8Array(await value.arrayBuffer());
    if (bytes.byteLength > mostFileBytes) throw new AppError("too_large", fileTooLarge);
    read.file = { fileName: plainFileName(value.name), bytes };
  }
  return read;
}
