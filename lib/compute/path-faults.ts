/** Whether paths, values and targets of a request mean anything for its run; each fault at its place. Pure. */
import { circuitPlace, requireValue } from "@/lib/line/circuit-path";
import type { Circuit } from "@/lib/line/element";
import { isInTime, judgeTargets, type TargetConditions } from "@/lib/line/targets";
import type { Target } from "@/lib/line/target";
import type { CircuitFault } from "@/lib/runs/circuit";

/** What the engine says of something impossible, as a sentence; undefined where it says nothing. */
export function refusal(attempt: () => unknown): string | undefined {
  try {
    attempt();
    return undefined;
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    const said = error.message.replace(/^\w+: /, "");
    return `${said.charAt(0).toUpperCase()}${said.slice(1)}.`;
  }
}

/** @param at - where in the request the path, and where its limits stand */
export function pathFaults(
  circuit: Circuit,
  path: string,
  limits: readonly [number, number],
  at: { path: string; limits: string },
): CircuitFault[] {
  const unknown = refusal(() => circuitPlace(circuit, path));
  if (unknown !== undefined) return [{ path: at.path, message: unknown }];
  return limitFaults(path, limits, at.limits);
}

/** Limits that a figure cannot take. */
export function limitFaults(path: string, limits: readonly [number, number], at: string): CircuitFault[] {
  return limits.flatMap((limit, n) => {
    const message = refusal(() => requireValue(path, limit));
    return message === undefined ? [] : [{ path: `${at}.${n}`, message }];
  });
}

/**
 * Targets that cannot be worked out for the run. One frequency is enough to tell, and what is a question of time is left
 * to be refused where it is computed, so that little is computed where everybody is served.
 */
export function targetFaults(
  circuit: Circuit,
  targets: readonly Target[],
  conditions: TargetConditions,
): CircuitFault[] {
  if (targets.length === 0) return [];
  const atOne = { ...conditions, frequencies: [conditions.frequencies[0]!] };
  const { drive } = conditions;
  const known = targets.map((target): Target =>
    drive && isInTime(target) ? harmless : { ...target, bandHz: undefined },
  );
  let faults: CircuitFault[] = [];
  const impossible = refusal(() => {
    faults = judgeTargets(circuit, known, { ...atOne, drive: undefined }).flatMap(({ why }, index) =>
      why === undefined ? [] : [{ path: `targets.${index}`, message: `It cannot be worked out here: ${why}` }],
    );
  });
  return impossible === undefined ? faults : [{ path: "targets", message: impossible }];
}

/** Stands for a target that is looked at elsewhere. */
const harmless: Target = { quantity: "returnLoss", atLeast: 0 };
