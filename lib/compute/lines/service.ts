/** The catalogue's cables that a request of `/compute` names, as lines to compute with. */
import type { Actor } from "@/lib/auth/actor";
import type { Cable } from "@/lib/cables/schema";
import { cableFinder } from "@/lib/cables/service";
import { refuse } from "@/lib/compute/refuse";
import type { Circuit as EngineCircuit, Element as EngineElement } from "@/lib/line/element";
import type { MatchLine } from "@/lib/line/match/match-request";
import { cableRefsOf, type CableRef, type CircuitFault, resolveElements } from "@/lib/runs/circuit";
import type { Circuit, Element, LineRef } from "@/lib/runs/circuit-schema";

export function toLine({ id, revision, designation, model }: Cable): MatchLine {
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
export function resolved(actor: Actor, elements: Element[], at: string): EngineElement[] {
  const find = lineFinder(
    actor,
    cableRefsOf({ elements }).map(({ ref }) => ref),
  );
  const result = resolveElements(elements, find);
  if ("elements" in result) return result.elements;
  refuse(result.faults.map(({ path, message }) => ({ path: `${at}.${path}.cableId`, message })));
  throw new Error("resolved: neither elements nor a fault");
}

/** @throws AppError where a cable is not in the catalogue */
export function resolvedCircuit(actor: Actor, circuit: Circuit): EngineCircuit {
  return { ...circuit, elements: resolved(actor, circuit.elements, "circuit.elements") };
}

/** The lines of references outside a circuit, in order. */
export function linesOf(actor: Actor, refs: { path: string; ref: LineRef }[]): MatchLine[] {
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
