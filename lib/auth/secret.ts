/** The secret the session cookie is sealed with: `SESSION_SECRET`, else one made once and kept beside the database. */
import "server-only";
import { randomBytes } from "node:crypto";
import { mkdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";

const shortest = 32;
let made: string | undefined;

function readOrMake(file: string): string {
  mkdirSync(path.dirname(file), { recursive: true });
  try {
    // "wx": of two processes starting at once one writes and the other reads what the first wrote.
    writeFileSync(file, randomBytes(32).toString("base64url"), { flag: "wx", mode: 0o600 });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== "EEXIST") throw error;
  }
  return readFileSync(file, "utf8").trim();
}

/** @throws Error when SESSION_SECRET is shorter than 32 characters */
export function sessionSecret(): string {
  const given = process.env.SESSION_SECRET;
  if (given) {
    if (given.length < shortest) throw new Error(`SESSION_SECRET must have at least ${shortest} characters.`);
    return given;
  }
  const database = process.env.DATABASE_FILE || path.join(process.cwd(), "data", "ropewalk.db");
  if (database === ":memory:") return (made ??= randomBytes(32).toString("base64url"));
  return (made ??= readOrMake(
    path.join(path.dirname(path.resolve(/* turbopackIgnore: true */ database)), "session-secret"),
  ));
}
