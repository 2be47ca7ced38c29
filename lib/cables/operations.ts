/** What can be asked of `/cables`. */
import { z } from "zod";
import { cablePageSchema, cableQuerySchema } from "@/lib/cables/query";
import { newCableSchema } from "@/lib/cables/new-cable";
import { cableSchema } from "@/lib/cables/schema";
import { daySchema } from "@/lib/cables/waivers/schema";
import { operation } from "@/lib/http/operation";

export const searchCatalogue = operation({
  id: "listCables",
  method: "GET",
  path: "/cables",
  summary: "Search the catalogue. Installers are shown the cables of their runs.",
  permission: "cables.read",
  query: cableQuerySchema,
  answer: { status: 200, description: "A page of entries.", schema: cablePageSchema },
});

export const readCable = operation({
  id: "readCable",
  method: "GET",
  path: "/cables/{cableId}",
  summary: "One entry, its current revision whole; with `on`, as people saw it at the end of that day.",
  permission: "cables.read",
  query: z.strictObject({ on: daySchema("The day").optional().describe("a day of UTC, 2026-03-01") }),
  answer: { status: 200, description: "The entry.", schema: cableSchema, hasEntityTag: true },
});

export const proposeCable = operation({
  id: "createCable",
  method: "POST",
  path: "/cables",
  summary: "Add an entry as a draft of one's own.",
  permission: "cables.propose",
  body: newCableSchema,
  answer: { status: 201, description: "The draft.", schema: cableSchema },
  refusals: ["conflict"],
});

export const takeBackCable = operation({
  id: "removeCable",
  method: "DELETE",
  path: "/cables/{cableId}",
  summary: "Take back a draft that was never submitted.",
  permission: "cables.propose",
  answer: { status: 204, description: "The draft is gone." },
  refusals: ["conflict"],
});
