/** What can be asked of `/cables`. */
import { cablePageSchema, cableQuerySchema } from "@/lib/cables/query";
import { cableSchema } from "@/lib/cables/schema";
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
  summary: "One entry, its current revision whole.",
  permission: "cables.read",
  answer: { status: 200, description: "The entry.", schema: cableSchema },
});
