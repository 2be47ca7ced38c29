/** The limit lines a team can hold figures against: those of the standards, and its own. */
import { and, asc, count, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { limitLines } from "@/db/schema/limit-lines";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { AppError } from "@/lib/http/errors";
import {
  type LimitLineItem,
  type LimitLineQuery,
  type NewLimitLine,
  newLimitLineSchema,
} from "@/lib/limit-lines/schema";
import { standardItems } from "@/lib/limit-lines/standards";

const mostLines = 200;

function listOwn(actor: Actor): LimitLineItem[] {
  return database()
    .select({ line: limitLines, addedByName: people.name })
    .from(limitLines)
    .innerJoin(people, eq(people.id, limitLines.addedById))
    .where(eq(limitLines.teamId, actor.teamId))
    .orderBy(asc(limitLines.name))
    .all()
    .map(({ line: { id, line, addedAt }, addedByName }) => ({
      ...{ id, ...newLimitLineSchema.parse(line) },
      ...{ isStandard: false, mark: null, addedByName, addedAt },
    }));
}

/** Those of the standards first, then the team's own by name. */
export function listLimitLines(actor: Actor, query: LimitLineQuery = {}): LimitLineItem[] {
  requirePermission(actor, "cables.readCatalogue");
  return [...standardItems, ...listOwn(actor)].filter(
    (line) =>
      (query.quantity === undefined || line.quantity === query.quantity) &&
      (query.of === undefined || line.of === query.of),
  );
}

/**
 * Adds a line of the team's own.
 * @throws AppError `forbidden`; `conflict` for a name that is taken, by a standard too, or a team with all it can hold
 */
export function addLimitLine(actor: Actor, line: NewLimitLine): LimitLineItem {
  requirePermission(actor, "limits.write");
  const { title, edition, clause } = line.source;
  const row = { id: crypto.randomUUID(), addedAt: new Date().toISOString() };
  database().transaction(
    (tx) => {
      const own = eq(limitLines.teamId, actor.teamId);
      const isTaken =
        standardItems.some(({ name }) => name === line.name) ||
        tx
          .select({ id: limitLines.id })
          .from(limitLines)
          .where(and(own, eq(limitLines.name, line.name)))
          .get();
      if (isTaken) throw new AppError("conflict", "A line with this name exists.", { name: ["This name is taken."] });
      const held = tx.select({ n: count() }).from(limitLines).where(own).get()?.n ?? 0;
      if (held >= mostLines) throw new AppError("conflict", `A team holds at most ${mostLines} limit lines.`);
      tx.insert(limitLines)
        .values({
          ...{ ...row, teamId: actor.teamId, addedById: actor.personId, name: line.name, line },
          source: [title, edition, clause].filter((part) => part !== null && part !== "").join(", "),
        })
        .run();
    },
    { behavior: "immediate" },
  );
  return { ...row, ...line, isStandard: false, mark: null, addedByName: actor.name };
}

/**
 * Takes a line of the team's own away.
 * @throws AppError `forbidden`; `not_found`; `conflict` for one of a standard
 */
export function removeLimitLine(actor: Actor, id: string): void {
  requirePermission(actor, "limits.write");
  if (standardItems.some((line) => line.id === id))
    throw new AppError("conflict", "This line is a standard's, and not the team's to take away.");
  const { changes } = database()
    .delete(limitLines)
    .where(and(eq(limitLines.teamId, actor.teamId), eq(limitLines.id, id)))
    .run();
  if (changes === 0) throw new AppError("not_found", "There is no such limit line.");
}
