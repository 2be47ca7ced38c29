/** The list of runs, a page at a time. */
import { and, count, desc, eq, inArray, or, sql, type SQL } from "drizzle-orm";
import { database } from "@/db/client";
import { runs } from "@/db/schema/runs";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { visibleRuns } from "@/lib/auth/visibility/service";
import { listDesignations } from "@/lib/cables/service";
import { olderThan } from "@/lib/http/latest-first";
import { defaultLimit, encodeCursor } from "@/lib/http/list";
import { cableIdsOf, totalLength } from "@/lib/runs/circuit";
import type { RunPage, RunQuery } from "@/lib/runs/query";
import type { RunItem } from "@/lib/runs/schema";

function found(text: string | undefined): SQL | undefined {
  if (!text) return undefined;
  const pattern = `%${text.toLowerCase().replaceAll(/[\\%_]/g, (character) => `\\${character}`)}%`;
  const columns = [runs.number, runs.name, runs.site, runs.folder];
  return or(...columns.map((column) => sql`lower_unicode(${column}) like ${pattern} escape '\\'`));
}

function toItem(row: typeof runs.$inferSelect, ownerName: string, names: Map<string, string>): RunItem {
  const { id, number, name, site, folder, state, condition, ownerId, version, changedAt, designHz, bandHz, circuit } =
    row;
  return {
    ...{ id, number, name, site, folder, state, condition, ownerId, ownerName, version, changedAt, designHz, bandHz },
    totalLengthM: totalLength(circuit),
    cables: cableIdsOf(circuit).flatMap((cableId) => names.get(cableId) ?? []),
  };
}

/** The runs the actor may see, the latest changed first. */
export function listRuns(actor: Actor, query: RunQuery = {}): RunPage {
  requirePermission(actor, "runs.read");
  const db = database();
  const matching = and(visibleRuns(actor), found(query.q), query.state ? inArray(runs.state, query.state) : undefined);
  const limit = query.limit ?? defaultLimit;
  const rows = db
    .select({ run: runs, ownerName: people.name })
    .from(runs)
    .innerJoin(people, eq(people.id, runs.ownerId))
    .where(and(matching, olderThan(query.cursor, runs.changedAt, runs.id)))
    .orderBy(desc(runs.changedAt), desc(runs.id))
    .limit(limit + 1)
    .all();
  const page = rows.slice(0, limit);
  const names = listDesignations(
    actor,
    page.flatMap(({ run }) => cableIdsOf(run.circuit)),
  );
  const last = page.at(-1)?.run;
  return {
    items: page.map(({ run, ownerName }) => toItem(run, ownerName, names)),
    nextCursor: last && rows.length > limit ? encodeCursor({ key: last.changedAt, id: last.id }) : null,
    total: db.select({ total: count() }).from(runs).where(matching).get()?.total ?? 0,
  };
}
