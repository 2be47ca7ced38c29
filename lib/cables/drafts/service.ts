/** Drafts of entries: written by anybody who may propose, taken back while nobody has reviewed them. */
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { derivedFigures } from "@/lib/cables/model";
import type { NewCable } from "@/lib/cables/new-cable";
import type { Cable } from "@/lib/cables/schema";
import { getCable } from "@/lib/cables/service";
import { cableWords } from "@/lib/cables/words";
import { AppError } from "@/lib/http/errors";

/**
 * Adds a draft to the team's catalogue.
 * @throws AppError `forbidden`; `conflict` where the designation is taken; `invalid_input` where the model has no finite figures
 */
export function createDraft(actor: Actor, input: NewCable): Cable {
  requirePermission(actor, "cables.propose");
  const { designation, aliases, name, family, model, construction, build, figures, limits } = input;
  const derived = derivedFigures(model, construction, limits);
  if (!Object.values(derived).every((value) => value === null || Number.isFinite(value)))
    throw new AppError("invalid_input", "The entry was not added.", {
      model: ["These values give no finite impedance, velocity or loss."],
    });
  return database().transaction(
    (tx) => {
      const isTaken = tx
        .select({ id: cables.id })
        .from(cables)
        .where(and(eq(cables.teamId, actor.teamId), eq(cables.designation, designation)))
        .get();
      if (isTaken)
        throw new AppError("conflict", `The catalogue already has ${designation}.`, {
          designation: ["Already in the catalogue."],
        });
      const id = crypto.randomUUID();
      const createdAt = new Date().toISOString();
      tx.insert(cables).values({ id, teamId: actor.teamId, designation, aliases, currentRevision: 1, createdAt }).run();
      tx.insert(cableRevisions)
        .values({
          ...{ cableId: id, revision: 1, state: "draft", reason: "First entry.", authorId: actor.personId, createdAt },
          ...{ name, family, model, construction, build, figures, limits },
          ...derived,
          words: cableWords(input),
        })
        .run();
      return getCable(actor, id);
    },
    { behavior: "immediate" },
  );
}

/**
 * Takes a draft back. By its author, a librarian or an admin, and only while it was never submitted.
 * @throws AppError `not_found`, `forbidden`, `conflict`
 */
export function deleteDraft(actor: Actor, cableId: string): void {
  requirePermission(actor, "cables.propose");
  database().transaction(
    (tx) => {
      const cable = getCable(actor, cableId);
      const revision = tx
        .select({ authorId: cableRevisions.authorId })
        .from(cableRevisions)
        .where(and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, cable.revision)))
        .get();
      if (cable.state !== "draft" || cable.revision !== 1)
        throw new AppError("conflict", "Only a draft that was never submitted can be taken back.");
      if (revision?.authorId !== actor.personId && !may(actor, "team.tidy"))
        throw new AppError("forbidden", "A draft is taken back by its author, a librarian or an admin.");
      tx.delete(cables).where(eq(cables.id, cableId)).run();
    },
    { behavior: "immediate" },
  );
}
