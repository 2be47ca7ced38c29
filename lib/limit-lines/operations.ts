/** What can be asked of `/limit-lines`. */
import { operation } from "@/lib/http/operation";
import { limitLineQuerySchema, limitLineSchema, limitLinesSchema, newLimitLineSchema } from "@/lib/limit-lines/schema";

export const readLimitLines = operation({
  id: "listLimitLines",
  method: "GET",
  path: "/limit-lines",
  summary: "The limit lines of the standards, with edition and how they are known, and the team's own.",
  permission: "cables.readCatalogue",
  query: limitLineQuerySchema,
  answer: { status: 200, description: "The lines.", schema: limitLinesSchema },
});

export const keepLimitLine = operation({
  id: "addLimitLine",
  method: "POST",
  path: "/limit-lines",
  summary: "Add a limit line of the team's own.",
  permission: "limits.write",
  body: newLimitLineSchema,
  answer: { status: 201, description: "The line.", schema: limitLineSchema },
  refusals: ["conflict"],
});

export const dropLimitLine = operation({
  id: "removeLimitLine",
  method: "DELETE",
  path: "/limit-lines/{limitLineId}",
  summary: "Take a limit line of the team's own away.",
  permission: "limits.write",
  answer: { status: 204, description: "It is gone." },
  refusals: ["conflict"],
});
