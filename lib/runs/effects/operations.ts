/** What can be asked of the effect of a cable on runs. */
import { operation } from "@/lib/http/operation";
import { affectedSchema } from "@/lib/runs/affected/schema";
import { usesQuerySchema, usesSchema } from "@/lib/runs/effects/schema";

export const readCableUses = operation({
  id: "readCableUses",
  method: "GET",
  path: "/cables/{cableId}/uses",
  summary: "Every run that uses a cable, worked out again with a revision of it; for designers, their own runs.",
  permission: "cables.readUses",
  query: usesQuerySchema,
  answer: { status: 200, description: "The runs, largest change first.", schema: usesSchema },
});

export const readAffected = operation({
  id: "readAffected",
  method: "GET",
  path: "/runs/{runId}/affected",
  summary: "Whether cables of a run have a later approved revision, and what taking it would change.",
  permission: "runs.read",
  answer: { status: 200, description: "The cables that have moved on, and the run both ways.", schema: affectedSchema },
});
