/** Files to bring in, for tests. */
import { database } from "@/db/client";
import { cableImports } from "@/db/schema/imports";
import { actor } from "@/tests/support/people";

/** An import of nothing, by the team's librarian. */
export function addImport(id: string): void {
  const at = "2026-01-01T00:00:00.000Z";
  const by = actor("librarian");
  database()
    .insert(cableImports)
    .values({ id, teamId: by.teamId, fileName: "old.csv", startedById: by.personId, startedAt: at, rowCount: 0 })
    .run();
}

/** A list as somebody keeps it: units in the head, a cell in feet, one row that contradicts itself, one that is none. */
export const oldSheet = [
  'Type,Description,Family,"Z0 (Ohm)",VF %,Cap. pF/m,Loop resistance Ω/km,Loss 10 MHz (dB/100m),Loss 100 MHz (dB/100m)',
  "QA-50,50 ohm feeder,coax,50,85,78.5,8.6,1.27,4.1",
  "QA-75,imported row,coax,75 ± 2,83,67,,,",
  "QA-93,in feet,coax,93,84,13.0 pF/ft,143,2.63,8.5",
  "QA-50,again,coax,50,85,78.5,8.6,1.27,4.1",
  "QA-1,nothing but a name,coax,50,,,,,",
  "=cmd|'/C calc'!A0,formula,coax,50,85,,,,",
].join("\r\n");
