/** What can be asked of an entry's lots. */
import { lotFormSchema, lotListSchema, lotSchema, newLotSchema } from "@/lib/cables/lots/schema";
import { operation } from "@/lib/http/operation";

export const listLotsOperation = operation({
  id: "listLots",
  method: "GET",
  path: "/cables/{cableId}/lots",
  summary: "Deliveries that were measured, each with the model it comes to.",
  permission: "cables.read",
  answer: { status: 200, description: "The lots.", schema: lotListSchema },
});

export const addLotOperation = operation({
  id: "addLot",
  method: "POST",
  path: "/cables/{cableId}/lots",
  summary:
    "Add a measured lot, or one reel of it; as a form also with the file it was measured in. By the author of the draft, " +
    "a librarian or an admin.",
  permission: "cables.propose",
  accepts: { "application/json": newLotSchema, "multipart/form-data": lotFormSchema },
  answer: { status: 201, description: "The lot.", schema: lotSchema },
  refusals: ["conflict"],
});
