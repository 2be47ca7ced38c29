/** What can be asked of the reviews. */
import { queueSchema } from "@/lib/cables/queue/schema";
import { operation } from "@/lib/http/operation";

export const readReviewQueue = operation({
  id: "readReviewQueue",
  method: "GET",
  path: "/review",
  summary: "Revisions in review, entries due for another look, problems reported, and what was settled lately.",
  permission: "cables.readUnapproved",
  answer: { status: 200, description: "The queue.", schema: queueSchema },
});
