/** The demo's former revisions, the one in review, the import in quarantine, and what was said of them. */
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableComments, cableWaivers } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { notices } from "@/db/schema/notices";
import { runs } from "@/db/schema/runs";
import { derivedFigures } from "@/lib/cables/model";
import type { Figure } from "@/lib/cables/schema";
import { cableWords } from "@/lib/cables/words";
import { modelOf } from "@/seeds/cables";
import lives from "@/seeds/data/cable-lives.json";
import team from "@/seeds/data/team.json";
import { figuresOf } from "@/seeds/figures";

type Revision = typeof cableRevisions.$inferInsert;

const authorId = "libby-thornquist";
const approverId = "nils-ferrant";
const sheet = "Maker's sheet, issue 1, page 2";

function shown(cableId: string, revision: number) {
  const at = and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, revision));
  return database().select().from(cableRevisions).where(at).get();
}

function add(row: Revision): boolean {
  return database().insert(cableRevisions).values(row).onConflictDoNothing().run().changes > 0;
}

type Former = (typeof lives.former)[number];

/** The figures a former revision had: some other than today's, some not yet there. */
function formerFigures(figures: readonly Figure[], { figures: others = [], withoutLossTable }: Former): Figure[] {
  const kept = withoutLossTable ? figures.filter(({ quantity }) => quantity !== "lossDbPerM") : figures;
  const isOther = ({ quantity, fromHz }: Figure) =>
    others.some((other) => other.quantity === quantity && (other.atHz === undefined || other.atHz === fromHz));
  const given = others.map(({ quantity, valueSi, asTyped, atHz }): Figure => {
    const at = atHz === undefined ? {} : { fromHz: atHz, toHz: atHz };
    const kind = quantity === "lossDbPerM" ? "typical" : "nominal";
    return { quantity, valueSi, asTyped, kind, temperatureC: 20, ...at, source: sheet };
  });
  return [...kept.filter((figure) => !isOther(figure)), ...given];
}

/** Only where the entry stands as the demo made it: in a database that is older it stays as it is. */
function addFormer(): void {
  for (const former of lives.former) {
    const today = shown(former.cableId, lives.former.length + 1);
    if (!today?.approvedAt) continue;
    const { cableId, revision, reason, createdAt, approvedAt } = former;
    const figures = formerFigures(today.figures, former);
    const stamp = { authorId, createdAt, submittedAt: createdAt, approvedById: approverId, approvedAt };
    add({ ...today, cableId, revision, state: "superseded", reason, ...stamp, figures, version: revision });
  }
}

function addInReview(): void {
  const { cableId, revision, reason, createdAt, submittedAt, dielectricMm, comments } = lives.inReview;
  const today = shown(cableId, 1);
  if (today?.construction?.kind !== "coax" || !today.build) return;
  const { family, build, limits } = today;
  const model = modelOf(lives.inReview.figures);
  const construction = { ...today.construction, dielectricMm, lossTangent: lives.inReview.figures.lossTangent };
  const figures = figuresOf(lives.inReview.figures, family, build.dielectric);
  const values = { model, construction, figures, ...derivedFigures(model, construction, limits) };
  const open = { state: "inReview" as const, condition: null, authorId, createdAt, submittedAt };
  const isAdded = add({
    ...today,
    revision,
    reason,
    ...open,
    approvedById: null,
    approvedAt: null,
    ...values,
    version: 2,
  });
  if (!isAdded) return;
  database()
    .insert(cableComments)
    .values(comments.map((comment) => ({ ...comment, cableId, revision })))
    .run();
}

function importedFigures(): Figure[] {
  const { figures, lossRows } = lives.import;
  const common = { temperatureC: 20, source: "imported row 7 of an old spreadsheet" };
  const rows = lossRows.map(([mhz = 0, loss = 0]): Figure => {
    const at = { fromHz: mhz * 1e6, toHz: mhz * 1e6 };
    const asTyped = `${loss} dB/100 m at ${mhz} MHz`;
    return { quantity: "lossDbPerM", valueSi: loss / 100, asTyped, kind: "typical", ...at, ...common };
  });
  return [...figures.map((figure): Figure => ({ ...figure, kind: "nominal", ...common })), ...rows];
}

function addImport(): void {
  const { id, designation, name, createdAt, modelOf: like } = lives.import;
  const model = shown(like, lives.former.length + 1)?.model ?? shown(like, 1)?.model;
  if (!model) return;
  const entry = { designation, aliases: [], name, family: "coaxial" as const, build: null };
  const { changes } = database()
    .insert(cables)
    .values({ id, teamId: team.team.id, designation, aliases: [], currentRevision: 1, createdAt })
    .onConflictDoNothing()
    .run();
  if (changes === 0) return;
  add({
    ...{ cableId: id, revision: 1, state: "quarantined", reason: "Imported.", authorId, createdAt },
    ...{ name, family: "coaxial", model, construction: null, build: null, figures: importedFigures(), limits: {} },
    ...derivedFigures(model, null, {}),
    words: cableWords(entry),
  });
}

/** Adds the revisions that are missing. */
export function seedCableLives(): void {
  database().transaction(() => {
    addFormer();
    addInReview();
    addImport();
  });
}

/** What concerns runs as well; once those are there. */
export function seedCableRecords(): void {
  const { id, cableId, runId, reason, days } = lives.waiver;
  const isThere = database().select({ id: runs.id }).from(runs).where(eq(runs.id, runId)).get();
  const until = new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);
  const given = { givenById: approverId, givenAt: new Date().toISOString() };
  if (isThere)
    database()
      .insert(cableWaivers)
      .values({ id, cableId, runId, reason, until, ...given })
      .onConflictDoNothing()
      .run();
  const { cableId: replaced, reason: why, approvedAt: at, notice } = lives.replaced;
  const text = `C75-F7 has a new revision 3: ${why} Revision 2 no longer goes into new runs. Used in R5.`;
  const told = { ...notice, teamId: team.team.id, at, kind: "superseded" as const, text, link: `/cables/${replaced}` };
  database().insert(notices).values(told).onConflictDoNothing().run();
}
