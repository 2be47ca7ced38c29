/** Measured lots of an entry, kept apart from its nominal values: a measurement never changes those. */
import { and, desc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableLots } from "@/db/schema/cable-records";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { addEvidence } from "@/lib/cables/evidence/service";
import { figuresOfLot } from "@/lib/cables/lots/figures";
import { modelOfLot } from "@/lib/cables/lots/model";
import type { Lot, LotList, NewLot } from "@/lib/cables/lots/schema";
import { mayAddRecords, requireRecords } from "@/lib/cables/records/service";
import { getCable } from "@/lib/cables/service";
import { AppError } from "@/lib/http/errors";
import type { Upload } from "@/lib/http/form";
import type { LineModel } from "@/lib/line/element";

const mostOfCable = 500;

/** The lots of an entry, or one of them. Whether the actor may read the entry has been decided. */
export function selectLots(cableId: string, model: LineModel, lotId?: string): Lot[] {
  const rows = database()
    .select({ row: cableLots, addedByName: people.name })
    .from(cableLots)
    .innerJoin(people, eq(people.id, cableLots.addedById))
    .where(and(eq(cableLots.cableId, cableId), lotId === undefined ? undefined : eq(cableLots.id, lotId)))
    .orderBy(desc(cableLots.measuredAt), desc(cableLots.addedAt))
    .all();
  return rows.map(({ row, addedByName }) => {
    const { id, lot, reel, lengthM, figures, note, measuredAt, addedAt } = row;
    return {
      id,
      lot,
      reel,
      lengthM,
      figures,
      note,
      measuredAt,
      addedByName,
      addedAt,
      model: modelOfLot(model, figures),
    };
  });
}

/** @throws AppError `not_found`, `forbidden` as reading the entry */
export function listLots(actor: Actor, cableId: string): LotList {
  requirePermission(actor, "cables.read");
  const { model } = getCable(actor, cableId);
  return { items: selectLots(cableId, model), mayAdd: mayAddRecords(actor, cableId) };
}

/**
 * Adds a lot, with the file it was measured in where there is one.
 * @throws AppError `forbidden`; `conflict` where the lot, or its reel, is there already; as `addEvidence` of the file
 */
export function addLot(actor: Actor, cableId: string, given: NewLot, file?: Upload): Lot {
  requireRecords(actor, cableId);
  const { model } = getCable(actor, cableId);
  const id = crypto.randomUUID();
  database().transaction(
    (tx) => {
      const { lot, reel, lengthM, note, measuredAt } = given;
      const same = and(eq(cableLots.cableId, cableId), eq(cableLots.lot, lot), eq(cableLots.reel, reel));
      const what = reel === "" ? `lot ${lot}` : `reel ${reel} of lot ${lot}`;
      if (tx.select({ id: cableLots.id }).from(cableLots).where(same).get())
        throw new AppError("conflict", `The entry has ${what} already.`, { lot: ["Already there."] });
      if (
        tx.select({ id: cableLots.id }).from(cableLots).where(eq(cableLots.cableId, cableId)).all().length >=
        mostOfCable
      )
        throw new AppError("conflict", `An entry has at most ${mostOfCable} lots.`);
      if (file) addEvidence(actor, cableId, { file, fields: { title: `Measurement of ${what}, ${measuredAt}` } });
      const stamp = { addedById: actor.personId, addedAt: new Date().toISOString() };
      tx.insert(cableLots)
        .values({ id, cableId, lot, reel, lengthM, figures: figuresOfLot(given), note, measuredAt, ...stamp })
        .run();
    },
    { behavior: "immediate" },
  );
  const [added] = selectLots(cableId, model, id);
  if (!added) throw new Error(`addLot: ${id} is gone`);
  return added;
}
