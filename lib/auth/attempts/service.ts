/** Limits on guessing passwords: attempts that have not succeeded, per network address and per account. */
import { createHash } from "node:crypto";
import { and, count, eq, gt, lt, min, or } from "drizzle-orm";
import type { SQLiteColumn } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { signInAttempts } from "@/db/schema/team";
import { AppError } from "@/lib/http/errors";

const windowMs = 15 * 60 * 1000;
export const mostPerAccount = 10;
export const mostPerAddress = 50;

export interface Attempt {
  id: number;
  accountHash: string;
}

// Hashed, so that the table does not become a list of what people mistyped into the address field.
const hashed = (text: string) => createHash("sha256").update(text).digest("hex");

function secondsToWait(column: SQLiteColumn, value: string, most: number, now: number): number {
  const row = database()
    .select({ attempts: count(), firstMs: min(signInAttempts.atMs) })
    .from(signInAttempts)
    .where(and(eq(column, value), gt(signInAttempts.atMs, now - windowMs)))
    .get();
  if (!row || row.attempts < most || row.firstMs === null) return 0;
  return Math.max(1, Math.ceil((row.firstMs + windowMs - now) / 1000));
}

/**
 * Counts an attempt before the password is looked at, so that many at once cannot slip through together.
 * @throws AppError `too_many_requests`, with the seconds to wait, whether or not the account exists
 */
export function beginAttempt(from: string, email: string): Attempt {
  const now = Date.now();
  const db = database();
  const addressHash = hashed(from);
  const accountHash = hashed(email);
  db.delete(signInAttempts)
    .where(lt(signInAttempts.atMs, now - windowMs))
    .run();
  const wait = Math.max(
    secondsToWait(signInAttempts.accountHash, accountHash, mostPerAccount, now),
    secondsToWait(signInAttempts.addressHash, addressHash, mostPerAddress, now),
  );
  if (wait > 0) {
    const minutes = Math.ceil(wait / 60);
    throw new AppError(
      "too_many_requests",
      `Too many attempts. Try again in ${minutes === 1 ? "a minute" : `${minutes} minutes`}.`,
      {},
      { headers: { "Retry-After": String(wait) } },
    );
  }
  const { lastInsertRowid } = db.insert(signInAttempts).values({ addressHash, accountHash, atMs: now }).run();
  return { id: Number(lastInsertRowid), accountHash };
}

/** An attempt has succeeded: it and the account's earlier ones no longer count. */
export function forgetAttempts(attempt: Attempt): void {
  database()
    .delete(signInAttempts)
    .where(or(eq(signInAttempts.id, attempt.id), eq(signInAttempts.accountHash, attempt.accountHash)))
    .run();
}
