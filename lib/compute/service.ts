/** Computing for whoever is signed in: finds the catalogue's cables they name, and stores nothing. */
import type { z } from "zod";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import type { Cable } from "@/lib/cables/schema";
import { cableFinder, listUsableCables } from "@/lib/cables/service";
import { lineAnswer, matchesAnswer, profileAnswer, sweepAnswer } from "@/lib/compute/answers";
import { matchesFaults, profileFaults, sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import type { lineRequestSchema, MatchesRequest, ProfileRequest, SweepRequest } from "@/lib/compute/schema";
import { AppError } from "@/lib/http/errors";
import type { Circuit as EngineCircuit, Element as EngineElement } from "@/lib/line/element";
import type { MatchLine } from "@/lib/line/match/match-request";
import { cableRefsOf, type CableRef, type CircuitFault, resolveElements } from "@/lib/runs/circuit";
import type { Circuit, Element, LineRef } from "@/lib/runs/circuit-schema";

const mostOfCatalogue = 200;

function refuse(faults: CircuitFault[]): void {
  if (faults.length === 0) return;
  const fields = Object.fromEntries(faults.map(({ path, message }) => [path, [message]]));
  throw new AppError("invalid_input", "This cannot be computed as asked.", fields);
}

/** The engine refuses with a RangeError what no schema foresaw; for the caller that is input like any other. */
function computed<Answer>(compute: () => Answer): Answer {
  try {
    return compute();
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw new AppError("invalid_input", `This cannot be computed: ${error.message.replace(/^\w+: /, "")}.`);
  }
}

function toLine({ id, revision, designation, model }: Cable): MatchLine {
  return { cableId: id, revision, label: designation, model };
}

/** A look-up of the references given as lines to compute with. */
function lineFinder(actor: Actor, refs: CableRef[]): (ref: CableRef) => MatchLine | undefined {
  const find = cableFinder(actor, refs);
  return (ref) => {
    const cable = find(ref);
    return cable && toLine(cable);
  };
}

/** @param at - path of the elements in the request */
function resolved(actor: Actor, elements: Element[], at: string): EngineElement[] {
  const find = lineFinder(
    actor,
    cableRefsOf({ elements }).map(({ ref }) => ref),
  );
  const result = resolveElements(elements, find);
  if ("elements" in result) return result.elements;
  refuse(result.faults.map(({ path, message }) => ({ path: `${at}.${path}.cableId`, message })));
  throw new Error("resolved: neither elements nor a fault");
}

function resolvedCircuit(actor: Actor, circuit: Circuit): EngineCircuit {
  return { ...circuit, elements: resolved(actor, circuit.elements, "circuit.elements") };
}

/** The lines of references outside a circuit, in order. */
function linesOf(actor: Actor, refs: { path: string; ref: LineRef }[]): MatchLine[] {
  const find = lineFinder(
    actor,
    refs.flatMap(({ ref }) => ("cableId" in ref ? [ref] : [])),
  );
  const faults: CircuitFault[] = [];
  const lines = refs.flatMap(({ path, ref }) => {
    const line = "cableId" in ref ? find(ref) : ref;
    if (!line) faults.push({ path: `${path}.cableId`, message: "There is no such cable in the catalogue." });
    return line ?? [];
  });
  refuse(faults);
  return lines;
}

export function computeLine(actor: Actor, request: z.output<typeof lineRequestSchema>) {
  requirePermission(actor, "compute.use");
  const [line] = linesOf(actor, [{ path: "line", ref: request.line }]);
  if (!line) throw new Error("computeLine: a line neither found nor refused");
  return computed(() => lineAnswer(line.model, request));
}

export function computeSweep(actor: Actor, request: SweepRequest) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(sweepFaults(request.circuit, frequenciesOf(request), request.planes));
  return computed(() => sweepAnswer(circuit, request));
}

export function computeProfile(actor: Actor, request: ProfileRequest) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(profileFaults(request.circuit, request.frequencyHz));
  return computed(() => profileAnswer(circuit, request));
}

function linesToCutFrom(actor: Actor, request: MatchesRequest): MatchLine[] {
  if (request.lines)
    return linesOf(
      actor,
      request.lines.map((ref, i) => ({ path: `lines.${i}`, ref })),
    );
  const usable = listUsableCables(actor).map(toLine);
  if (usable.length > mostOfCatalogue)
    refuse([
      {
        path: "catalogue",
        message: `The catalogue has ${usable.length} usable cables; name at most ${mostOfCatalogue} of them in lines.`,
      },
    ]);
  return usable;
}

export function computeMatches(actor: Actor, request: MatchesRequest) {
  requirePermission(actor, "compute.use");
  const { load, targetOhm, designHz, bandHz, returnLossDb, methods, partQ, tolerance, temperatureC } = request;
  const lines = linesToCutFrom(actor, request);
  const [feeder] = request.feeder ? linesOf(actor, [{ path: "feeder", ref: request.feeder }]) : [];
  refuse(matchesFaults(request, lines.length));
  const behind = request.place && resolved(actor, request.place.behind, "place.behind");
  const asked = { load, targetOhm, designHz, bandHz, returnLossDb, methods, partQ, tolerance, temperatureC };
  return computed(() => matchesAnswer({ ...asked, lines, feeder, behind }));
}
