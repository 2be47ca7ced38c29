/** Which revisions of which cables a run uses. */
import { asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { runCables } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { isUsable, unapprovedStates } from "@/lib/cables/model";
import type { Cable, CableState } from "@/lib/cables/schema";
import { cableFinder } from "@/lib/cables/service";
import { listWaivedCables } from "@/lib/cables/waivers/service";
import { AppError, type FieldErrors } from "@/lib/http/errors";
import { cableRefsOf } from "@/lib/runs/circuit";
import type { Circuit } from "@/lib/runs/circuit-schema";
import { type Pinned, pinnedRef } from "@/lib/runs/pins";

const refusals: Partial<Record<CableState, string>> = {
  draft: "is a draft; only approved cables go into a run",
  inReview: "is in review; only approved cables go into a run",
  quarantined: "is quarantined and must not be used anew",
  superseded: "is superseded",
  withdrawn: "is withdrawn and must not be used anew",
};

function refusalOf(cable: Cable): string {
  const instead = cable.state === "superseded" && cable.successor ? `; use ${cable.successor.designation}` : "";
  return `${cable.designation} ${refusals[cable.state]}${instead}.`;
}

/** What was never approved goes into no run, waiver or not. */
const isWaived = ({ id, state }: Cable, waived: Set<string>) => waived.has(id) && !unapprovedStates.includes(state);

/**
 * The revisions a circuit uses, once each.
 * @param pinned - what the run uses already: that may stay, whatever has become of it
 * @param runId - the run, once there is one: a waiver lets it have what others may not
 * @throws AppError `invalid_input` with a sentence at every reference that is unknown or must not be used anew
 */
export function pinCables(actor: Actor, circuit: Circuit, pinned: Pinned, runId?: string): Pinned {
  const refs = cableRefsOf(circuit).map(({ path, ref }) => ({ path, ref: pinnedRef(ref, pinned) }));
  const find = cableFinder(
    actor,
    refs.map(({ ref }) => ref),
  );
  const waived = runId === undefined ? new Set<string>() : listWaivedCables(runId);
  const fields: FieldErrors = {};
  const pins = new Map<string, Pinned[number]>();
  for (const { path, ref } of refs) {
    const cable = find(ref);
    const isPinned = pinned.some((pin) => pin.cableId === cable?.id && pin.revision === cable.revision);
    if (!cable)
      fields[`circuit.${path}.cableId`] = ["There is no such cable, or no such revision of it, in the catalogue."];
    else if (!isPinned && !isUsable(cable.state) && !isWaived(cable, waived))
      fields[`circuit.${path}.cableId`] = [refusalOf(cable)];
    else pins.set(`${cable.id} ${cable.revision}`, { cableId: cable.id, revision: cable.revision });
  }
  if (Object.keys(fields).length > 0) throw new AppError("invalid_input", "A cable of the run cannot be used.", fields);
  return [...pins.values()];
}

/** What a run uses, as kept with it. */
export function listPinned(runId: string): Pinned {
  return database()
    .select({ cableId: runCables.cableId, revision: runCables.revision })
    .from(runCables)
    .where(eq(runCables.runId, runId))
    .orderBy(asc(runCables.cableId), asc(runCables.revision))
    .all();
}

/** Puts what a run uses in the place of what it used. Call inside the transaction that saves the run. */
export function replacePinned(runId: string, pinned: Pinned): void {
  const db = database();
  db.delete(runCables).where(eq(runCables.runId, runId)).run();
  if (pinned.length > 0)
    db.insert(runCables)
      .values(pinned.map((pin) => ({ runId, ...pin })))
      .run();
}
