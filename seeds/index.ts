/** Fills a migrated database: the demo, or with DEMO=off the first admin. Running it again changes nothing. */
import { fileURLToPath } from "node:url";
import { seedCables } from "@/seeds/cables";
import { seedRuns } from "@/seeds/runs";
import { seedFirstAdmin, seedTeam } from "@/seeds/team";

/** The demo team with its people, catalogue and runs. */
export async function seedDemo(): Promise<void> {
  await seedTeam();
  seedCables();
  seedRuns();
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  if (process.env.DEMO === "off") {
    const told = await seedFirstAdmin(process.env);
    if (told) console.log(told);
  } else {
    await seedDemo();
    console.log("The demo is in place.");
  }
}
