/** Sessions and tokens: who may ask as whom, and until when. */
import { createHash, randomBytes } from "node:crypto";
import { and, eq, gt, isNull, lt, ne, or } from "drizzle-orm";
import { database } from "@/db/client";
import { members, people, sessions, teams, tokens } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { beginAttempt, forgetAttempts } from "@/lib/auth/attempts/service";
import { sessionSeconds } from "@/lib/auth/cookie";
import { hashPassword, isPassword } from "@/lib/auth/password";
import { AppError } from "@/lib/http/errors";
import type { PasswordChange, SignIn } from "@/lib/team/schema";

/** What is stored of a session's key or a token: it cannot be turned back. Both are random, so no salt is needed. */
export function hashOfSecret(secret: string): string {
  return createHash("sha256").update(secret).digest("hex");
}

const actorColumns = {
  personId: people.id,
  name: people.name,
  email: people.email,
  teamId: teams.id,
  teamName: teams.name,
  role: members.role,
};

/** The member behind a session's key; undefined when it has ended, or the person has left the team. */
export function findSessionActor(key: string): Actor | undefined {
  const sessionId = hashOfSecret(key);
  const row = database()
    .select(actorColumns)
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .innerJoin(teams, eq(teams.id, sessions.teamId))
    .innerJoin(members, and(eq(members.personId, sessions.personId), eq(members.teamId, sessions.teamId)))
    .where(and(eq(sessions.id, sessionId), gt(sessions.expiresAtMs, Date.now())))
    .get();
  return row && { ...row, sessionId };
}

/** The member a bearer token acts as; undefined when it is unknown, revoked or expired. */
export function findTokenActor(token: string): Actor | undefined {
  return database()
    .select(actorColumns)
    .from(tokens)
    .innerJoin(people, eq(people.id, tokens.personId))
    .innerJoin(teams, eq(teams.id, tokens.teamId))
    .innerJoin(members, and(eq(members.personId, tokens.personId), eq(members.teamId, tokens.teamId)))
    .where(
      and(
        eq(tokens.hash, hashOfSecret(token)),
        isNull(tokens.revokedAt),
        or(isNull(tokens.expiresAtMs), gt(tokens.expiresAtMs, Date.now())),
      ),
    )
    .get();
}

function openSession(personId: string, teamId: string): string {
  const key = randomBytes(32).toString("base64url");
  const now = Date.now();
  const db = database();
  db.delete(sessions).where(lt(sessions.expiresAtMs, now)).run();
  db.insert(sessions)
    .values({
      id: hashOfSecret(key),
      personId,
      teamId,
      createdAt: new Date(now).toISOString(),
      expiresAtMs: now + sessionSeconds * 1000,
    })
    .run();
  return key;
}

/**
 * Opens a session. One and the same refusal for a wrong password and an unknown address, after the same work.
 * @param from - network address of the browser, for the limit on attempts
 * @returns the key for the cookie, and who is now signed in
 * @throws AppError `unauthenticated`, or `too_many_requests` with Retry-After
 */
export async function signIn(input: SignIn, from: string): Promise<{ key: string; actor: Actor }> {
  const attempt = beginAttempt(from, input.email);
  const person = database()
    .select({ id: people.id, passwordHash: people.passwordHash, teamId: members.teamId })
    .from(people)
    .innerJoin(members, eq(members.personId, people.id))
    .where(eq(people.email, input.email))
    .orderBy(members.teamId)
    .get();
  const isRight = await isPassword(input.password, person?.passwordHash);
  if (!person || !isRight) throw new AppError("unauthenticated", "The mail address or the password is not right.");
  forgetAttempts(attempt);
  const key = openSession(person.id, person.teamId);
  const actor = findSessionActor(key);
  if (!actor) throw new Error("signIn: the session just opened cannot be found");
  return { key, actor };
}

/** Ends the session asked through. */
export function signOut(actor: Actor): void {
  if (actor.sessionId === undefined) return;
  database().delete(sessions).where(eq(sessions.id, actor.sessionId)).run();
}

/**
 * Changes one's own password and ends one's other sessions.
 * @throws AppError `invalid_input` at `current` when it is wrong, `forbidden` for a token, `too_many_requests`
 */
export async function changePassword(actor: Actor, input: PasswordChange, from: string): Promise<void> {
  const { sessionId } = actor;
  if (sessionId === undefined)
    throw new AppError("forbidden", "A password is changed by its owner, signed in, not by a token.");
  const attempt = beginAttempt(from, actor.email);
  const db = database();
  const person = db
    .select({ passwordHash: people.passwordHash })
    .from(people)
    .where(eq(people.id, actor.personId))
    .get();
  if (!(await isPassword(input.current, person?.passwordHash)))
    throw new AppError("invalid_input", "The current password is not right.", {
      current: ["This is not the current password."],
    });
  forgetAttempts(attempt);
  const passwordHash = await hashPassword(input.next);
  db.transaction(
    (tx) => {
      tx.update(people).set({ passwordHash }).where(eq(people.id, actor.personId)).run();
      tx.delete(sessions)
        .where(and(eq(sessions.personId, actor.personId), ne(sessions.id, sessionId)))
        .run();
    },
    { behavior: "immediate" },
  );
}
