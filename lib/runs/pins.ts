/** Which revision a reference means in a run. Pure. */
import type { CableRef } from "@/lib/runs/circuit";
import type { Run } from "@/lib/runs/schema";

export type Pinned = Run["pinned"];

/** A reference with the revision it means: its own, else the one the run already pins, else the current one. */
export function pinnedRef({ cableId, revision }: CableRef, pinned: Pinned): CableRef {
  const pin = pinned.find((one) => one.cableId === cableId);
  return { cableId, revision: revision ?? pin?.revision };
}
