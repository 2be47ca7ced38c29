/** What a team has agreed on, read and changed. */
import { createHash } from "node:crypto";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { teams } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { AppError } from "@/lib/http/errors";
import { entityTag } from "@/lib/http/etag";
import { type HouseRules, usualRules } from "@/lib/team/rules";

/** The rules that hold for the actor's team; for services that keep them. */
export function rulesInForce(actor: Actor): HouseRules {
  const row = database().select({ rules: teams.rules }).from(teams).where(eq(teams.id, actor.teamId)).get();
  return { ...usualRules, ...row?.rules };
}

/** What the rules are told apart by: they have no version of their own. */
export function rulesTag(rules: HouseRules): string {
  const { isTwoPerson, mayAdminsApprove, reviewMonths } = rules;
  return createHash("sha256")
    .update(JSON.stringify([isTwoPerson, mayAdminsApprove, reviewMonths]))
    .digest("base64url");
}

export function staleRules(current: HouseRules): AppError {
  const message = "The house rules were changed meanwhile. Nothing of yours was written.";
  const headers = { ETag: entityTag(rulesTag(current)) };
  return new AppError("stale", message, {}, { headers, members: { current } });
}

/** @throws AppError `forbidden` */
export function getRules(actor: Actor): HouseRules {
  requirePermission(actor, "team.readRules");
  return rulesInForce(actor);
}

/**
 * Changes the rules given and leaves the rest.
 * @param tag - what the rules changed are told apart by
 * @throws AppError `forbidden`, `stale` with the current rules
 */
export function changeRules(actor: Actor, tag: string, change: Partial<HouseRules>): HouseRules {
  requirePermission(actor, "team.rules");
  return database().transaction(
    (tx) => {
      const before = rulesInForce(actor);
      if (rulesTag(before) !== tag) throw staleRules(before);
      const rules = { ...before, ...change };
      tx.update(teams).set({ rules }).where(eq(teams.id, actor.teamId)).run();
      return rules;
    },
    { behavior: "immediate" },
  );
}
