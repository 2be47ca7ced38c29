/** What can be asked of `/runs`. */
import { operation } from "@/lib/http/operation";
import { z } from "zod";
import { commentSchema, commentsSchema, newCommentSchema } from "@/lib/runs/comments/schema";
import { runPageSchema, runQuerySchema } from "@/lib/runs/query";
import { newRunSchema, runChangeSchema, runSchema } from "@/lib/runs/schema";

export const searchRuns = operation({
  id: "listRuns",
  method: "GET",
  path: "/runs",
  summary: "The team's runs; installers are shown issued ones assigned to them.",
  permission: "runs.read",
  query: runQuerySchema,
  answer: { status: 200, description: "A page of runs.", schema: runPageSchema },
});

export const startRun = operation({
  id: "createRun",
  method: "POST",
  path: "/runs",
  summary: "Start a run.",
  permission: "runs.write",
  body: newRunSchema,
  answer: { status: 201, description: "The run.", schema: runSchema, hasEntityTag: true },
});

export const readRun = operation({
  id: "readRun",
  method: "GET",
  path: "/runs/{runId}",
  summary: "One run.",
  permission: "runs.read",
  answer: { status: 200, description: "The run.", schema: runSchema, hasEntityTag: true },
});

export const changeRun = operation({
  id: "changeRun",
  method: "PATCH",
  path: "/runs/{runId}",
  summary: "Change fields of a draft run; a stale version is refused with the current run under `current`.",
  permission: "runs.write",
  body: runChangeSchema,
  needsMatch: true,
  answer: { status: 200, description: "The run as it now stands.", schema: runSchema, hasEntityTag: true },
  refusals: ["conflict"],
});

export const removeRun = operation({
  id: "removeRun",
  method: "DELETE",
  path: "/runs/{runId}",
  summary: "Take a draft run away.",
  permission: "runs.write",
  needsMatch: true,
  answer: { status: 204, description: "The run is gone." },
  refusals: ["conflict"],
});

export const handOverRun = operation({
  id: "handOverRun",
  method: "POST",
  path: "/runs/{runId}/owner",
  summary: "Give a run another owner. By its owner, a librarian or an admin.",
  permission: "runs.write",
  body: z.strictObject({ ownerId: z.string().min(1).max(80) }).meta({ id: "HandOver" }),
  needsMatch: true,
  answer: { status: 200, description: "The run as it now stands.", schema: runSchema, hasEntityTag: true },
});

export const listRunComments = operation({
  id: "listRunComments",
  method: "GET",
  path: "/runs/{runId}/comments",
  summary: "What was said about a run, oldest first.",
  permission: "runs.read",
  answer: { status: 200, description: "The comments.", schema: commentsSchema },
});

export const addRunComment = operation({
  id: "addRunComment",
  method: "POST",
  path: "/runs/{runId}/comments",
  summary: "Say something about a run.",
  permission: "runs.comment",
  body: newCommentSchema,
  answer: { status: 201, description: "The comment.", schema: commentSchema },
  refusals: ["conflict"],
});
