/** The letters of a team, for those who answer for them. */
import { and, count, desc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { letters } from "@/db/schema/notices";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { olderThan } from "@/lib/http/latest-first";
import { defaultLimit, encodeCursor } from "@/lib/http/list";
import type { LetterItem, LetterPage, LetterQuery } from "@/lib/mail/schema";
import { mailSettings } from "@/lib/mail/settings";

/** The letters written to the actor's team, the latest first. */
export function listLetters(actor: Actor, query: LetterQuery = {}): LetterPage {
  requirePermission(actor, "team.readLetters");
  const db = database();
  const hasMailServer = mailSettings() !== null;
  const matching = and(
    eq(letters.teamId, actor.teamId),
    query.state === undefined ? undefined : eq(letters.state, query.state),
  );
  const limit = query.limit ?? defaultLimit;
  const rows = db
    .select()
    .from(letters)
    .where(and(matching, olderThan(query.cursor, letters.writtenAt, letters.id)))
    .orderBy(desc(letters.writtenAt), desc(letters.id))
    .limit(limit + 1)
    .all();
  const toItem = ({ teamId: _, nextTryAt, ...letter }: (typeof rows)[number]): LetterItem => ({
    ...letter,
    nextTryAt: letter.state === "waiting" && hasMailServer ? nextTryAt : null,
  });
  const page = rows.slice(0, limit);
  const last = page.at(-1);
  return {
    items: page.map(toItem),
    nextCursor: last && rows.length > limit ? encodeCursor({ key: last.writtenAt, id: last.id }) : null,
    total: db.select({ total: count() }).from(letters).where(matching).get()?.total ?? 0,
    hasMailServer,
  };
}
