/**
 * What can be done to the line of a run: pure functions from one list of elements to the next, and the history that
 * makes any of it undoable. The screen calls these; nothing here knows the screen.
 */
import { alike } from "@/lib/runs/alike";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";
import type { RunChange } from "@/lib/runs/schema";

export type NewKind = Element["kind"];

/** The values an element starts with when it is added beside others. */
export function newElement(kind: NewKind, line: LineRef, referenceOhm: number): Element {
  switch (kind) {
    case "cable":
      return { kind, line, lengthM: 1 };
    case "parallel":
      return {
        kind,
        branches: [
          { line, lengthM: 1 },
          { line, lengthM: 1 },
        ],
      };
    case "stub":
      return { kind, connection: "shunt", end: "open", line, lengthM: 0.5 };
    case "shunt":
      return { kind, termination: { kind: "constant", reOhm: referenceOhm, imOhm: 0 } };
    case "part":
      return { kind, connection: "series", lH: 1e-7 };
    case "pad":
      return { kind, lossDb: 3, inputOhm: referenceOhm, outputOhm: referenceOhm };
    case "joint":
      return { kind, lossDbAtOneGhz: 0.05 };
    case "transformer":
      return { kind, turnsRatio: 1 };
  }
}

export function insertAt(elements: readonly Element[], index: number, added: readonly Element[]): Element[] {
  return [...elements.slice(0, index), ...added, ...elements.slice(index)];
}

export function removeAt(elements: readonly Element[], index: number): Element[] {
  return elements.filter((_, i) => i !== index);
}

export function replaceAt(elements: readonly Element[], index: number, next: Element): Element[] {
  return elements.map((element, i) => (i === index ? next : element));
}

/** Moves the element at `from` so that it stands at `to`; outside the line nothing moves. */
export function move(elements: readonly Element[], from: number, to: number): Element[] {
  const moved = elements[from];
  if (!moved || to < 0 || to >= elements.length) return [...elements];
  return insertAt(removeAt(elements, from), to, [moved]);
}

/** Cuts a cable in two at `at` metres from its source side (half way unless told); other elements stay whole. */
export function split(elements: readonly Element[], index: number, at?: number): Element[] {
  const element = elements[index];
  if (element?.kind !== "cable" || !(element.lengthM > 0)) return [...elements];
  const first = Math.min(Math.max(at ?? element.lengthM / 2, 0), element.lengthM);
  const halves: Element[] = [
    { ...element, lengthM: first },
    { ...element, lengthM: element.lengthM - first },
  ];
  return insertAt(removeAt(elements, index), index, halves);
}

/** The part of a run that people edit. */
export type RunDraft = Required<RunChange>;

export function draftOf(run: RunDraft): RunDraft {
  const {
    name,
    site,
    folder,
    circuit,
    temperatureC,
    designHz,
    availablePowerW,
    bandHz,
    targets,
    sourceName,
    loadName,
  } = run;
  return {
    name,
    site,
    folder,
    circuit,
    temperatureC,
    designHz,
    availablePowerW,
    bandHz,
    targets,
    sourceName,
    loadName,
  };
}

/** The fields in which two drafts differ, with the value of the second: the body of a PATCH. */
export function changeBetween(saved: RunDraft, next: RunDraft): RunChange {
  const keys = Object.keys(next) as (keyof RunDraft)[];
  const changed = keys.filter((key) => !alike(saved[key], next[key]));
  return Object.fromEntries(changed.map((key) => [key, next[key]]));
}

export interface History {
  past: RunDraft[];
  present: RunDraft;
  future: RunDraft[];
  /** edits with the same tag in a row are one step: typing a length is not twelve */
  tag: string | null;
}

export function history(present: RunDraft): History {
  return { past: [], present, future: [], tag: null };
}

/** @param tag - what was edited, for example "elements.2.lengthM"; null never merges with the edit before */
export function edited(before: History, present: RunDraft, tag: string | null): History {
  if (tag !== null && tag === before.tag) return { ...before, present, future: [] };
  return { past: [...before.past, before.present], present, future: [], tag };
}

export function undone(h: History): History {
  const last = h.past.at(-1);
  if (!last) return h;
  return { past: h.past.slice(0, -1), present: last, future: [h.present, ...h.future], tag: null };
}

export function redone(h: History): History {
  const [next, ...future] = h.future;
  if (!next) return h;
  return { past: [...h.past, h.present], present: next, future, tag: null };
}

/** A field whose text cannot be read: the text stays, with the sentence beside it. Keyed by path, "elements.2.lengthM". */
export type Faults = Readonly<Record<string, { text: string; message: string }>>;

/** The same faults after the elements were rearranged: they go where their element went, and away with it. */
export function faultsAfter(faults: Faults, before: readonly Element[], after: readonly Element[]): Faults {
  const isRearranged = before.length !== after.length || before.some((e, i) => e !== after[i] && after.includes(e));
  if (!isRearranged) return faults;
  const moved = Object.entries(faults).flatMap(([path, fault]) => {
    const [, index, rest] = /^elements\.(\d+)\.(.*)$/.exec(path) ?? [];
    if (index === undefined) return [[path, fault] as const];
    const element = before[Number(index)];
    const now = element === undefined ? -1 : after.indexOf(element);
    return now < 0 ? [] : [[`elements.${now}.${rest}`, fault] as const];
  });
  return Object.fromEntries(moved);
}
