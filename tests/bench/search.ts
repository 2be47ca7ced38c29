/** Search over 20,000 generated entries, against one SQL query for the same words already corrected. */
import { openDatabase, replaceDatabase } from "@/db/client";
import { migrateDatabase } from "@/db/migrate";
import { cableRevisions, cables } from "@/db/schema/cables";
import { teams } from "@/db/schema/team";
import { modelFromNominal } from "@/lib/line/cable";
import { derivedFigures } from "@/lib/cables/model";
import type { Build } from "@/lib/cables/schema";
import { listCables } from "@/lib/cables/service";
import { cableWords } from "@/lib/cables/words";
import { addPeople, actor, home } from "@/tests/support/people";
import { medianMs, ms, pairedMs, row, times } from "@/tests/bench/timing";

const count = 20_000;
const jackets = ["PE", "PVC", "LSZH", "PUR", "FEP"];
const dielectrics = ["foam PE", "solid PE", "foam-skin", "solid PTFE"];
const screens = ["foil and braid", "tinned braid", "corrugated copper", "double braid"];
const uses = ["outdoor", "indoor", "burial", "mast", "studio", "tray", "marine", "rack"];

/** The same "random" figures at every run. */
function generator(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 48271) % 2147483647) / 2147483647;
}

function fill(database: ReturnType<typeof openDatabase>): void {
  const random = generator(20260301);
  const pick = <T>(list: readonly T[]) => list[Math.floor(random() * list.length)]!;
  database.transaction((tx) => {
    for (let i = 0; i < count; i++) {
      const z0 = pick([50, 75, 93, 100, 120]);
      const diameter = Math.round(30 + random() * 200) / 10;
      const build: Build = {
        ...{
          conductor: pick(["solid copper", "7-strand copper", "copper tube"]),
          isStranded: random() > 0.5,
          dielectric: "foam",
        },
        ...{
          dielectricName: pick(dielectrics),
          screen: ["braid"],
          screenName: pick(screens),
          jacket: pick(jackets),
          pairCount: 1,
        },
      };
      const entry = {
        designation: `G${z0}-${i}`,
        aliases: [],
        name: `${z0} Ω ${Math.round(diameter)} mm ${pick(uses)} low-loss`,
        family: "coaxial" as const,
        build,
      };
      const model = modelFromNominal({
        z0,
        velocityFactor: 0.66 + random() * 0.25,
        conductors: [{ form: "sqrt", r0OhmPerM: 0.01, skinCornerRadPerS: 1e5 }],
      });
      const construction = {
        kind: "coax",
        innerMm: 1,
        dielectricMm: 4,
        relativePermittivity: 1.5,
        lossTangent: 0,
        outerDiameterMm: diameter,
      } as const;
      const id = `g${i}`;
      tx.insert(cables)
        .values({
          id,
          teamId: home.id,
          designation: entry.designation,
          aliases: [],
          preferred: false,
          currentRevision: 1,
          createdAt: "2026-01-01",
        })
        .run();
      tx.insert(cableRevisions)
        .values({
          ...{
            cableId: id,
            revision: 1,
            state: "approved",
            reason: "Generated.",
            authorId: actor("librarian").personId,
            createdAt: "2026-01-01",
          },
          ...{ name: entry.name, family: entry.family, model, construction, build, figures: [], limits: {} },
          ...derivedFigures(model, construction, {}),
          words: cableWords(entry),
        })
        .run();
    }
  });
}

const corrected = [
  { typed: "screned outdor 75 ohm", sql: '"outdoor"', z0: [71.25, 78.75] },
  { typed: "lowloss 10 milimeter foam", sql: '"lowloss" AND "foam"', z0: null },
  { typed: "corugated burial", sql: '"corrugated" AND "burial"', z0: null },
] as const;

export async function benchSearch(): Promise<void> {
  process.env.DATABASE_FILE = ":memory:";
  const database = openDatabase(":memory:");
  migrateDatabase(database);
  replaceDatabase(database);
  await addPeople();
  fill(database);
  const asking = actor("designer");
  const total = database.select().from(teams).all().length;
  if (total === 0) throw new Error("no team to search in");
  for (const { typed, sql, z0 } of corrected) {
    const query = database.$client.prepare(
      `select c.id from cable_search join cables c on cable_search.cable_id = c.id and cable_search.revision = c.current_revision
       join cable_revisions r on r.cable_id = c.id and r.revision = c.current_revision
       where cable_search match 'words : (${sql})' ${z0 ? `and r.z0_ohm between ${z0[0]} and ${z0[1]}` : ""} order by bm25(cable_search) limit 50`,
    );
    const [ours, theirs] = pairedMs(
      () => listCables(asking, { q: typed, lossAtHz: 100e6 }),
      () => query.all(),
    );
    row(
      `Search “${typed}” in ${count.toLocaleString("en")}; SQL, words corrected`,
      ms(ours),
      ms(theirs),
      times(ours / theirs),
    );
  }
  row("Search, first letters “scr”", ms(medianMs(() => listCables(asking, { q: "scr", lossAtHz: 100e6 }))));
  row(
    "Catalogue, nothing typed, first page with facets",
    ms(medianMs(() => listCables(asking, { facets: true, lossAtHz: 100e6 }))),
  );
  replaceDatabase(undefined);
  database.$client.close();
}
