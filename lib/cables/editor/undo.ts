/** What was done in a form, so that any of it can be undone. Pure. */
export interface Steps<T> {
  past: readonly T[];
  present: T;
  future: readonly T[];
  /** what was changed last: changes of one thing in a row are one step */
  tag: string | null;
}

const mostSteps = 200;

export function steps<T>(present: T): Steps<T> {
  return { past: [], present, future: [], tag: null };
}

/** @param tag - what was changed; null never joins the step before */
export function stepped<T>(before: Steps<T>, present: T, tag: string | null): Steps<T> {
  if (tag !== null && tag === before.tag) return { ...before, present, future: [] };
  return { past: [...before.past, before.present].slice(-mostSteps), present, future: [], tag };
}

export function undone<T>(before: Steps<T>): Steps<T> {
  const last = before.past.at(-1);
  if (last === undefined) return before;
  return { past: before.past.slice(0, -1), present: last, future: [before.present, ...before.future], tag: null };
}

export function redone<T>(before: Steps<T>): Steps<T> {
  const [next, ...future] = before.future;
  if (next === undefined) return before;
  return { past: [...before.past, before.present], present: next, future, tag: null };
}
