/** What can be asked of an entry's revisions. */
import { eventsSchema } from "@/lib/cables/events/schema";
import {
  cableChangeSchema,
  cableRevisionSchema,
  newRevisionSchema,
  revisionLinesSchema,
} from "@/lib/cables/revisions/schema";
import { operation } from "@/lib/http/operation";

export const listCableRevisions = operation({
  id: "listCableRevisions",
  method: "GET",
  path: "/cables/{cableId}/revisions",
  summary: "The revisions of an entry that one may read, newest first.",
  permission: "cables.read",
  answer: { status: 200, description: "The revisions.", schema: revisionLinesSchema },
});

export const beginCableRevision = operation({
  id: "beginCableRevision",
  method: "POST",
  path: "/cables/{cableId}/revisions",
  summary: "Begin a revision as a draft of one's own, copied from the current one.",
  permission: "cables.propose",
  body: newRevisionSchema,
  answer: { status: 201, description: "The draft.", schema: cableRevisionSchema, hasEntityTag: true },
  refusals: ["conflict"],
});

export const readCableRevision = operation({
  id: "readCableRevision",
  method: "GET",
  path: "/cables/{cableId}/revisions/{revision}",
  summary: "One revision, whole.",
  permission: "cables.read",
  answer: { status: 200, description: "The revision.", schema: cableRevisionSchema, hasEntityTag: true },
});

export const changeCable = operation({
  id: "changeCable",
  method: "PATCH",
  path: "/cables/{cableId}",
  summary:
    "Change fields of the open draft, by its author, a librarian or an admin; a stale version is refused with the draft under `current`.",
  permission: "cables.propose",
  body: cableChangeSchema,
  needsMatch: true,
  answer: { status: 200, description: "The draft as it now stands.", schema: cableRevisionSchema, hasEntityTag: true },
  refusals: ["conflict"],
});

export const listCableEvents = operation({
  id: "listCableEvents",
  method: "GET",
  path: "/cables/{cableId}/events",
  summary: "Every step in the life of an entry, oldest first.",
  permission: "cables.read",
  answer: { status: 200, description: "The steps.", schema: eventsSchema },
});
