/** Which revisions of which cables a run uses. */
import { asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { runCables } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { isUsable } from "@/lib/cables/model";
import type { Cable, CableState } from "@/lib/cables/schema";
import { cableFinder } from "@/lib/cables/service";
import { AppError, type FieldErrors } from "@/lib/http/errors";
import { cableRefsOf, type CableRef } from "@/lib/runs/circuit";
import type { Circuit } from "@/lib/runs/circuit-schema";
import type { Run } from "@/lib/runs/schema";

export type Pinned = Run["pinned"];

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

/** The revision a reference means in a run: its own, else the one the run already pins, else the current one. */
function asked(ref: CableRef, pinned: Pinned): CableRef {
  const pin = pinned.find((one) => one.cableId === ref.cableId);
  return { cableId: ref.cableId, revision: ref.revision ?? pin?.revision };
}

/**
 * The revisions a circuit uses, once each.
 * @param pinned - what the run uses already: that may stay, whatever has become of it
 * @throws AppError `invalid_input` with a sentence at every reference that is unknown or must not be used anew
 */
export function pinCables(actor: Actor, circuit: Circuit, pinned: Pinned): Pinned {
  const refs = cableRefsOf(circuit).map(({ path, ref }) => ({ path, ref: asked(ref, pinned) }));
  const find = cableFinder(
    actor,
    refs.map(({ ref }) => ref),
  );
  const fields: FieldErrors = {};
  const pins = new Map<string, Pinned[number]>();
  for (const { path, ref } of refs) {
    const cable = find(ref);
    const isPinned = pinned.some((pin) => pin.cableId === cable?.id && pin.revision === cable.revision);
    if (!cable)
      fields[`circuit.${path}.cableId`] = ["There is no such cable, or no such revision of it, in the catalogue."];
    else if (!isPinned && !isUsable(cable.state)) fields[`circuit.${path}.cableId`] = [refusalOf(cable)];
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
