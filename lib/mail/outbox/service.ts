/**
 * The letters that wait. A letter is taken by pushing its next try beyond the time one can take, inside a transaction, so
 * that of two processes only one sends it, and one whose process died comes back by itself.
 */
import { and, asc, eq, lte } from "drizzle-orm";
import { database } from "@/db/client";
import { letters } from "@/db/schema/notices";
import { nextTry } from "@/lib/mail/pauses";
import { type Letter, type Outcome, usualPatience } from "@/lib/mail/send";

/** How long a letter taken is left alone, milliseconds: far beyond what sending one can take. */
const leaseMs = 5 * usualPatience.whole;

/** A letter of ours to send, and which try this is. */
export interface TakenLetter extends Letter {
  tries: number;
}

/** Takes the letter that has been due longest; undefined when none is. */
export function takeLetter(nowMs: number): TakenLetter | undefined {
  const now = new Date(nowMs).toISOString();
  return database().transaction(
    (tx) => {
      const due = tx
        .select()
        .from(letters)
        .where(and(eq(letters.state, "waiting"), lte(letters.nextTryAt, now)))
        .orderBy(asc(letters.nextTryAt), asc(letters.id))
        .limit(1)
        .get();
      if (!due) return undefined;
      const tries = due.tries + 1;
      const nextTryAt = new Date(nowMs + leaseMs).toISOString();
      tx.update(letters).set({ tries, nextTryAt }).where(eq(letters.id, due.id)).run();
      const { id, toAddress, subject, body, writtenAt } = due;
      return { id, toAddress, subject, body, writtenAt, tries };
    },
    { behavior: "immediate" },
  );
}

/**
 * Writes down what came of a letter that was taken. Says nothing of one that somebody else has taken since.
 * @param nowMs - milliseconds since 1970
 */
export function settleLetter({ id, tries }: TakenLetter, outcome: Outcome, nowMs: number): void {
  const mine = and(eq(letters.id, id), eq(letters.state, "waiting"), eq(letters.tries, tries));
  const write = (change: Partial<typeof letters.$inferInsert>) =>
    database().update(letters).set(change).where(mine).run();
  if (outcome.kind === "sent") {
    write({ state: "sent", sentAt: new Date(nowMs).toISOString(), error: null });
    return;
  }
  const nextTryAt = outcome.kind === "refused" ? null : nextTry(tries, nowMs);
  write({ error: outcome.words, ...(nextTryAt === null ? { state: "givenUp" } : { nextTryAt }) });
}
