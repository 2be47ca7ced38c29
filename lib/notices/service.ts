/** Telling people: a notice in the product and a letter to their address, written with what they are about. */
import { and, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { letters, notices } from "@/db/schema/notices";
import { members, people, teams } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { oneLine } from "@/lib/mail/letter";

export type NoticeKind = (typeof notices.$inferInsert)["kind"];

export interface Notice {
  kind: NoticeKind;
  /** a sentence, without the names of the product or the team */
  text: string;
  /** address within the product, with its leading slash */
  link: string;
}

const publicUrl = () => (process.env.PUBLIC_URL ?? `http://127.0.0.1:${process.env.PORT ?? 3000}`).replace(/\/$/, "");

/**
 * Tells members of the actor's team something, once each, and not the actor. Call inside the transaction of what is told,
 * so that neither happens without the other.
 */
export function notify(actor: Actor, personIds: readonly string[], notice: Notice): void {
  if (!/^\/(?!\/)/.test(notice.link)) throw new Error(`notify: ${notice.link} is no address within the product`);
  const others = [...new Set(personIds)].filter((id) => id !== actor.personId);
  if (others.length === 0) return;
  const db = database();
  const told = db
    .select({ personId: people.id, email: people.email, teamName: teams.name })
    .from(members)
    .innerJoin(people, eq(people.id, members.personId))
    .innerJoin(teams, eq(teams.id, members.teamId))
    .where(and(eq(members.teamId, actor.teamId), inArray(members.personId, others)))
    .all();
  const at = new Date().toISOString();
  for (const { personId, email, teamName } of told) {
    db.insert(notices)
      .values({ id: crypto.randomUUID(), teamId: actor.teamId, personId, at, ...notice })
      .run();
    db.insert(letters)
      .values({
        ...{ id: crypto.randomUUID(), teamId: actor.teamId, toAddress: email, state: "waiting" },
        ...{ writtenAt: at, nextTryAt: at },
        subject: oneLine(`${teamName}: ${notice.text}`, 200),
        body: `${notice.text}\n\n${publicUrl()}${notice.link}\n`,
      })
      .run();
  }
}
