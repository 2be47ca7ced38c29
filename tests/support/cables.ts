/** Cables and circuits for tests; the figures are made up and only need to be possible. */
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { derivedFigures } from "@/lib/cables/model";
import type { Build, CableState, Construction, Family } from "@/lib/cables/schema";
import { cableWords } from "@/lib/cables/words";
import type { LineModel } from "@/lib/line/element";
import type { NewRun } from "@/lib/runs/schema";
import { actor, home } from "@/tests/support/people";

export const coaxModel: LineModel = {
  conductors: [{ form: "sqrt", r0OhmPerM: 0.01, skinCornerRadPerS: 1e5 }],
  lInfHPerM: 200e-9,
  cFPerM: 80e-12,
  lossTangent: 1e-4,
};

const build: Build = {
  conductor: "2 mm solid copper",
  isStranded: false,
  dielectric: "foam",
  dielectricName: "PE",
  screen: ["foil", "braid"],
  screenName: "foil and braid",
  jacket: "PE",
  pairCount: 1,
};

interface Given {
  id: string;
  designation?: string;
  name?: string;
  aliases?: string[];
  state?: CableState;
  condition?: string;
  family?: Family;
  team?: { id: string; name: string };
  model?: LineModel;
  outerDiameterMm?: number;
  authorId?: string;
  preferred?: boolean;
  maxFrequencyHz?: number;
  successorId?: string;
}

/** Adds an entry with one revision; approved and written by the team's librarian unless told otherwise. */
export function addCable(given: Given): void {
  const { id, designation = id.toUpperCase(), name = "test cable", aliases = [], state = "approved" } = given;
  const { family = "coaxial", team = home, model = coaxModel, outerDiameterMm, maxFrequencyHz } = given;
  const createdAt = "2026-01-01T00:00:00.000Z";
  // Of the 50 Ω and 0.8339 that the model has.
  const construction: Construction = {
    ...{
      kind: "coax",
      innerMm: 2,
      dielectricMm: 5.436,
      relativePermittivity: 1.438,
      lossTangent: 1e-4,
      outerDiameterMm,
    },
  };
  const limits = { maxFrequencyHz };
  const authorId = given.authorId ?? actor(team === home ? "librarian" : "admin", team).personId;
  const isApproved = state !== "draft" && state !== "inReview";
  const db = database();
  db.insert(cables)
    .values({
      ...{
        id,
        teamId: team.id,
        designation,
        aliases,
        preferred: given.preferred ?? false,
        currentRevision: 1,
        createdAt,
      },
      successorId: given.successorId,
      equivalence: given.successorId === undefined ? undefined : "needsRedesign",
    })
    .run();
  db.insert(cableRevisions)
    .values({
      ...{ cableId: id, revision: 1, state, reason: "First entry.", authorId, createdAt, name, family, model },
      condition: given.condition ?? null,
      ...{ construction, build, figures: [], limits, approvedAt: isApproved ? createdAt : null },
      ...derivedFigures(model, construction, limits),
      words: cableWords({ designation, aliases, name, family, build }),
    })
    .run();
}

/** A run of one cable between 50 Ω and a load. */
export function newRun(cableId: string, change: Partial<NewRun> = {}): NewRun {
  return {
    name: "Buoy link",
    site: "Pier 3",
    folder: "",
    circuit: {
      source: { kind: "constant", reOhm: 50, imOhm: 0 },
      elements: [{ kind: "cable", name: "Feeder", line: { cableId }, lengthM: 12 }],
      load: { kind: "constant", reOhm: 75, imOhm: 0 },
    },
    temperatureC: 20,
    designHz: 100e6,
    availablePowerW: 10,
    bandHz: [90e6, 110e6],
    targets: [],
    sourceName: "Radio",
    loadName: "Aerial",
    ...change,
  };
}
