/** What can be asked of the effect of a cable on runs. */
import { operation } from "@/lib/http/operation";
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
