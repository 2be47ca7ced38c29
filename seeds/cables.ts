/** The demo's catalogue: 25 entries, each in the revision that people see. */
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { derivedFigures } from "@/lib/cables/model";
import type { Build, CableState, Construction, Family, Figure, Limits } from "@/lib/cables/schema";
import { cableWords } from "@/lib/cables/words";
import type { LineModel } from "@/lib/line/element";
import lives from "@/seeds/data/cable-lives.json";
import data from "@/seeds/data/cables.json";
import { figuresOf, type GivenFigures } from "@/seeds/figures";
import team from "@/seeds/data/team.json";

interface Entry {
  id: string;
  designation: string;
  aliases: string[];
  name: string;
  family: Family;
  state: CableState;
  condition: string | null;
  preferred: boolean;
  successor: { cableId: string; equivalence: "dropIn" | "electricallyEqual" | "needsRedesign" } | null;
  figures: GivenFigures;
  construction: Construction;
  build: Build;
  limits: Limits;
}

const authorId = "libby-thornquist";
const approverId = "nils-ferrant";
const enteredAt = "2026-01-12T09:00:00.000Z";
const approvedAt = "2026-01-19T14:00:00.000Z";
const neverApproved: CableState[] = ["draft", "inReview"];

/** The line model of the figures: one lumped conductor term. */
export function modelOf(figures: GivenFigures): LineModel {
  const { loopResistanceOhmPerKm, skinCornerKhz, inductanceNhPerM, capacitancePfPerM, lossTangent } = figures;
  return {
    conductors: [
      { form: "sqrt", r0OhmPerM: loopResistanceOhmPerKm / 1000, skinCornerRadPerS: 2 * Math.PI * skinCornerKhz * 1000 },
    ],
    lInfHPerM: inductanceNhPerM / 1e9,
    cFPerM: capacitancePfPerM / 1e12,
    lossTangent,
  };
}

/** The number of the revision people see: those before it are in `cable-lives.ts`. */
const currentNumber = (id: string) => 1 + lives.former.filter(({ cableId }) => cableId === id).length;

/** When and why that revision was written: with the whole catalogue, or when it replaced a former one. */
function writing(id: string) {
  const { cableId, reason, createdAt, approvedAt: at } = lives.replaced;
  return cableId === id
    ? { reason, createdAt, approvedAt: at }
    : { reason: "First entry.", createdAt: enteredAt, approvedAt };
}

function revisionOf(entry: Entry): typeof cableRevisions.$inferInsert {
  const { id, name, family, state, condition, construction, build, limits } = entry;
  const model = modelOf(entry.figures);
  const figures: Figure[] = figuresOf(entry.figures, family, build.dielectric);
  const { reason, createdAt, approvedAt: at } = writing(id);
  const approval = neverApproved.includes(state) ? {} : { approvedById: approverId, approvedAt: at };
  const revision = currentNumber(id);
  const submittedAt = state === "draft" ? null : createdAt;
  return {
    ...{ cableId: id, revision, state, condition, reason, authorId, createdAt, submittedAt, ...approval },
    // One counter for all revisions of an entry; the former ones are at 1.
    version: revision,
    ...{ name, family, model, construction, build, figures, limits },
    ...derivedFigures(model, construction, limits),
    words: cableWords(entry),
  };
}

/** Adds the entries that are missing. */
export function seedCables(): void {
  const entries = data.cables as Entry[];
  // A successor must be there before the entry that names it.
  const ordered = [...entries].sort((a, b) => Number(a.successor !== null) - Number(b.successor !== null));
  database().transaction((tx) => {
    for (const entry of ordered) {
      const { id, designation, aliases, preferred, successor } = entry;
      const { changes } = tx
        .insert(cables)
        .values({
          ...{ id, teamId: team.team.id, designation, aliases, preferred, createdAt: enteredAt },
          currentRevision: currentNumber(id),
          successorId: successor?.cableId,
          equivalence: successor?.equivalence,
        })
        .onConflictDoNothing()
        .run();
      if (changes > 0) tx.insert(cableRevisions).values(revisionOf(entry)).run();
    }
  });
}
