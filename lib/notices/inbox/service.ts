/** One's own notices: nobody reads or marks another's. */
import { and, count, desc, eq, inArray, isNull, lte, type SQL } from "drizzle-orm";
import { database } from "@/db/client";
import { notices } from "@/db/schema/notices";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { olderThan } from "@/lib/http/latest-first";
import { defaultLimit, encodeCursor } from "@/lib/http/list";
import type { NoticeItem, NoticePage, NoticeQuery, Reading } from "@/lib/notices/schema";

const own = (actor: Actor) => and(eq(notices.personId, actor.personId), eq(notices.teamId, actor.teamId));

function countWhere(condition: SQL | undefined): number {
  return database().select({ n: count() }).from(notices).where(condition).get()?.n ?? 0;
}

/** How many of the actor's notices have not been read. */
export function countUnread(actor: Actor): number {
  requirePermission(actor, "notices.own");
  return countWhere(and(own(actor), isNull(notices.readAt)));
}

function toItem({ id, at, kind, text, link, readAt }: typeof notices.$inferSelect): NoticeItem {
  return { id, at, kind, text, link, isRead: readAt !== null };
}

/** The actor's notices, the latest first. */
export function listNotices(actor: Actor, query: NoticeQuery = {}): NoticePage {
  requirePermission(actor, "notices.own");
  const matching = and(own(actor), query.unread && isNull(notices.readAt));
  const limit = query.limit ?? defaultLimit;
  const rows = database()
    .select()
    .from(notices)
    .where(and(matching, olderThan(query.cursor, notices.at, notices.id)))
    .orderBy(desc(notices.at), desc(notices.id))
    .limit(limit + 1)
    .all();
  const page = rows.slice(0, limit);
  const last = page.at(-1);
  return {
    items: page.map(toItem),
    nextCursor: last && rows.length > limit ? encodeCursor({ key: last.at, id: last.id }) : null,
    total: countWhere(matching),
    unread: countUnread(actor),
  };
}

/**
 * Marks notices of the actor's as read; when each was first read stays.
 * @returns how many are left unread
 */
export function markRead(actor: Actor, reading: Reading): number {
  requirePermission(actor, "notices.own");
  const named = "ids" in reading ? inArray(notices.id, reading.ids) : undefined;
  const last = "upTo" in reading ? reading.upTo : undefined;
  const upTo = last === undefined ? undefined : lte(notices.at, new Date(last).toISOString());
  database()
    .update(notices)
    .set({ readAt: new Date().toISOString() })
    .where(and(own(actor), isNull(notices.readAt), named, upTo))
    .run();
  return countUnread(actor);
}
