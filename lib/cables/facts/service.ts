/**
 * What the catalogue is searched, filtered and sorted by, kept in memory for each team. Reading 20,000 rows and working
 * out as many losses takes some 200 ms; nobody should wait that long for each letter typed.
 */
import { eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { teams } from "@/db/schema/team";
import type { Candidate } from "@/lib/cables/filter";
import { Kept } from "@/lib/cables/facts/kept";
import { lossDbPer100m } from "@/lib/cables/model";
import { currentRevision } from "@/lib/cables/rows/service";
import type { LineModel } from "@/lib/line/element";

/** An entry without its loss, which depends on the question. */
type Fact = Omit<Candidate, "lossDbPer100m"> & { modelIndex: number };

interface Catalogue {
  version: number;
  /** by designation */
  facts: Fact[];
  models: LineModel[];
  /** place of a model by its stored text: equal ones are read and worked out once */
  modelIndexes: Map<string, number>;
  /** losses of the models, by frequency */
  losses: Kept<number, Float64Array>;
  /** the entries with their loss, by frequency */
  views: Kept<number, Candidate[]>;
}

const mostTeams = 16;
const mostFrequencies = 6;

// A team's copy is good as long as its version has not moved; triggers move it with every change, whoever makes it.
const copies = new WeakMap<object, Kept<string, Catalogue>>();

function readRows(teamId: string) {
  return database()
    .select({
      id: cables.id,
      designation: cables.designation,
      preferred: cables.preferred,
      revision: cableRevisions.revision,
      state: cableRevisions.state,
      authorId: cableRevisions.authorId,
      family: cableRevisions.family,
      z0Ohm: cableRevisions.z0Ohm,
      velocityFactor: cableRevisions.velocityFactor,
      capacitanceFPerM: cableRevisions.capacitanceFPerM,
      outerDiameterMm: cableRevisions.outerDiameterMm,
      maxFrequencyHz: cableRevisions.maxFrequencyHz,
      modelText: sql<string>`${cableRevisions.model}`,
    })
    .from(cables)
    .innerJoin(cableRevisions, currentRevision)
    .where(eq(cables.teamId, teamId))
    .all();
}

/** The catalogue as it is now. What `before` has of models that are still there is taken over. */
function readCatalogue(teamId: string, version: number, before: Catalogue | undefined): Catalogue {
  const modelIndexes = new Map<string, number>();
  const models: LineModel[] = [];
  const earlier: number[] = [];
  const facts = readRows(teamId).map(({ modelText, ...fact }) => {
    let modelIndex = modelIndexes.get(modelText);
    if (modelIndex === undefined) {
      const known = before?.modelIndexes.get(modelText);
      modelIndex = models.push(before?.models[known ?? -1] ?? (JSON.parse(modelText) as LineModel)) - 1;
      modelIndexes.set(modelText, modelIndex);
      earlier.push(known ?? -1);
    }
    return { ...fact, modelIndex };
  });
  facts.sort((a, b) => (a.designation < b.designation ? -1 : a.designation > b.designation ? 1 : 0));
  const losses = new Kept<number, Float64Array>(mostFrequencies);
  for (const [frequency, known] of before?.losses.entries() ?? [])
    losses.put(
      frequency,
      Float64Array.from(models, (model, i) => known[earlier[i] ?? -1] ?? lossDbPer100m(model, frequency)),
    );
  return { version, facts, models, modelIndexes, losses, views: new Kept(mostFrequencies) };
}

function catalogueOf(teamId: string): Catalogue | undefined {
  const db = database();
  const team = db.select({ version: teams.catalogueVersion }).from(teams).where(eq(teams.id, teamId)).get();
  if (!team) return undefined;
  let ofDatabase = copies.get(db);
  if (!ofDatabase) copies.set(db, (ofDatabase = new Kept(mostTeams)));
  const kept = ofDatabase.get(teamId);
  return kept?.version === team.version ? kept : ofDatabase.put(teamId, readCatalogue(teamId, team.version, kept));
}

function lossesOf({ losses, models }: Catalogue, frequency: number): Float64Array {
  return (
    losses.get(frequency) ??
    losses.put(
      frequency,
      Float64Array.from(models, (model) => lossDbPer100m(model, frequency)),
    )
  );
}

// Spelt out: copying "the rest" of an object takes five times as long, and there are many of them.
function candidate(fact: Fact, lossDbPer100m: number | null): Candidate {
  return {
    id: fact.id,
    designation: fact.designation,
    family: fact.family,
    state: fact.state,
    preferred: fact.preferred,
    revision: fact.revision,
    authorId: fact.authorId,
    z0Ohm: fact.z0Ohm,
    velocityFactor: fact.velocityFactor,
    capacitanceFPerM: fact.capacitanceFPerM,
    outerDiameterMm: fact.outerDiameterMm,
    maxFrequencyHz: fact.maxFrequencyHz,
    lossDbPer100m,
  };
}

/**
 * Every entry of a team in its current revision, by designation, whoever may see it. The same array while nothing of the
 * catalogue changes: do not change it.
 * @param lossAtHz - frequency for the loss, hertz; the loss is null without it
 */
export function listFacts(teamId: string, lossAtHz: number | undefined): readonly Candidate[] {
  const catalogue = catalogueOf(teamId);
  if (!catalogue) return [];
  const key = lossAtHz ?? 0;
  const kept = catalogue.views.get(key);
  if (kept) return kept;
  const losses = lossAtHz === undefined ? undefined : lossesOf(catalogue, lossAtHz);
  const view = catalogue.facts.map((fact) => candidate(fact, losses?.[fact.modelIndex] ?? null));
  return catalogue.views.put(key, view);
}
