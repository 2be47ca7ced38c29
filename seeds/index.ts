/** Fills a migrated database: the demo, or with DEMO=off the first admin. Running it again changes nothing. */
import { fileURLToPath } from "node:url";
import { database } from "@/db/client";
import { teams } from "@/db/schema/team";
import { isDemo } from "@/lib/team/demo";
import { seedCableEvents } from "@/seeds/cable-events";
import { seedCableLives, seedCableRecords } from "@/seeds/cable-lives";
import { seedCables } from "@/seeds/cables";
import { seedNotices } from "@/seeds/notices";
import { seedLots } from "@/seeds/lots";
import { seedRuns } from "@/seeds/runs";
import demo from "@/seeds/data/team.json";
import { seedFirstAdmin, seedTeam } from "@/seeds/team";

/** The demo team with its people, catalogue, runs and notices. */
export async function seedDemo(): Promise<void> {
  await seedTeam();
  seedCables();
  seedCableLives();
  seedCableEvents();
  seedLots();
  seedRuns();
  seedCableRecords();
  seedNotices();
}

/**
 * The demo's passwords are printed for all to read, so it never shares a database with a team of its own.
 * @throws Error when the database is the other kind
 */
export function refuseMixing(isDemo: boolean): void {
  const ids = database()
    .select({ id: teams.id })
    .from(teams)
    .all()
    .map(({ id }) => id);
  const holdsDemo = ids.includes(demo.team.id);
  if (isDemo && !holdsDemo && ids.length > 0)
    throw new Error("This database holds a team of its own, and the demo's passwords are public. Start with DEMO=off.");
  if (!isDemo && holdsDemo)
    throw new Error("This database holds the demo, whose passwords are public. Give another file in DATABASE_FILE.");
}

async function seed(): Promise<string | undefined> {
  const asDemo = isDemo();
  refuseMixing(asDemo);
  if (!asDemo) return seedFirstAdmin(process.env);
  await seedDemo();
  return "The demo is in place.";
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  try {
    const told = await seed();
    if (told) console.log(told);
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  }
}
