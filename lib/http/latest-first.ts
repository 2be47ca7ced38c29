/** Where a list that shows the latest first goes on. */
import { and, eq, lt, or, type AnyColumn, type SQL } from "drizzle-orm";
import type { Cursor } from "@/lib/http/list";

/**
 * What comes after a cursor.
 * @param at - when, ISO 8601 in one zone, so that the order is that of the text
 */
export function olderThan(cursor: Cursor | undefined, at: AnyColumn, id: AnyColumn): SQL | undefined {
  if (!cursor) return undefined;
  const key = String(cursor.key);
  return or(lt(at, key), and(eq(at, key), lt(id, cursor.id)));
}
