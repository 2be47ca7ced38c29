/** Pages of a list: `limit`, an opaque `cursor`, and the Link header of RFC 8288. */
import { z } from "zod";

export const defaultLimit = 50;
export const mostPerPage = 200;

/** A cursor names the last item seen by what it is sorted by and its id, so that a page neither skips nor repeats when the list changes. */
export interface Cursor {
  key: string | number | null;
  id: string;
}

export function encodeCursor(cursor: Cursor): string {
  const bytes = new TextEncoder().encode(JSON.stringify([cursor.key, cursor.id]));
  return btoa(String.fromCharCode(...bytes))
    .replaceAll("+", "-")
    .replaceAll("/", "_")
    .replaceAll("=", "");
}

const cursorContent = z.tuple([z.union([z.string(), z.number(), z.null()]), z.string()]);

function decodeCursor(text: string): Cursor | undefined {
  try {
    const bytes = Uint8Array.from(atob(text.replaceAll("-", "+").replaceAll("_", "/")), (character) =>
      character.charCodeAt(0),
    );
    const read = cursorContent.safeParse(JSON.parse(new TextDecoder().decode(bytes)));
    return read.success ? { key: read.data[0], id: read.data[1] } : undefined;
  } catch {
    return undefined; // not something we gave out
  }
}

/** Query fields every list takes. */
export const pageFields = {
  limit: z
    .string({ error: "The limit is given once." })
    .regex(/^\d{1,9}$/, { error: "The limit is a whole number." })
    .transform(Number)
    .pipe(
      z
        .int()
        .min(1, { error: "The limit is at least 1." })
        .max(mostPerPage, { error: `The limit is at most ${mostPerPage}.` }),
    )
    .optional()
    .describe(`items per page, default ${defaultLimit}, at most ${mostPerPage}`),
  cursor: z
    .string({ error: "The cursor is given once." })
    .max(1000, { error: "This is not a cursor we gave out." })
    .transform((text, context) => {
      const cursor = decodeCursor(text);
      if (cursor) return cursor;
      context.addIssue({ code: "custom", message: "This is not a cursor we gave out." });
      return z.NEVER;
    })
    .optional()
    .describe("`nextCursor` of the page before"),
};

export const nextCursorSchema = z.string().nullable().describe("for the next page; null on the last");

export interface Page<T> {
  items: T[];
  nextCursor: string | null;
  total: number;
}

/** The answer with a page, its Link header pointing at the next one under the same filters. */
export function pageResponse<T>(request: Request, page: Page<T>): Response {
  const headers: Record<string, string> = { "Cache-Control": "no-store" };
  if (page.nextCursor !== null) {
    const { pathname, searchParams } = new URL(request.url);
    searchParams.set("cursor", page.nextCursor);
    headers.Link = `<${pathname}?${searchParams.toString()}>; rel="next"`;
  }
  return Response.json(page, { headers });
}
