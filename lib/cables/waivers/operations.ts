/** What can be asked of waivers. */
import { operation } from "@/lib/http/operation";
import { newWaiverSchema, waiverSchema, waiversSchema } from "@/lib/cables/waivers/schema";

export const readWaivers = operation({
  id: "listWaivers",
  method: "GET",
  path: "/cables/{cableId}/waivers",
  summary: "The waivers of an entry, newest first.",
  permission: "cables.read",
  answer: { status: 200, description: "The waivers.", schema: waiversSchema },
});

export const addWaiver = operation({
  id: "giveWaiver",
  method: "POST",
  path: "/cables/{cableId}/waivers",
  summary: "Let one run have a cable that it otherwise could not, until a date.",
  permission: "cables.review",
  body: newWaiverSchema,
  answer: { status: 201, description: "The waiver.", schema: waiverSchema },
  refusals: ["conflict"],
});

export const takeBackWaiver = operation({
  id: "endWaiver",
  method: "DELETE",
  path: "/cables/{cableId}/waivers/{waiverId}",
  summary: "Take a waiver back before its end; it stays in the list.",
  permission: "cables.review",
  answer: { status: 200, description: "The waiver.", schema: waiverSchema },
  refusals: ["conflict"],
});
