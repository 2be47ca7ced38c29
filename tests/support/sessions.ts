import { randomBytes } from "node:crypto";
import { database } from "@/db/client";
import { sessions } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { hashOfSecret } from "@/lib/auth/service";

/** Opens a session without the cost of checking a password; the sign-in itself has tests of its own. */
export function insertSession(actor: Actor, expiresAtMs = Date.now() + 60_000): string {
  const key = randomBytes(32).toString("base64url");
  database()
    .insert(sessions)
    .values({
      id: hashOfSecret(key),
      personId: actor.personId,
      teamId: actor.teamId,
      createdAt: new Date().toISOString(),
      expiresAtMs,
    })
    .run();
  return key;
}
