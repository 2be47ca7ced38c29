/** What can be asked of the reviews. */
import { queueSchema, waitingCountSchema } from "@/lib/cables/queue/schema";
import { operation } from "@/lib/http/operation";

export const readReviewQueue = operation({
  id: "readReviewQueue",
  method: "GET",
  path: "/review",
  summary: "Revisions in review, entries due for another look, problems reported, and what was settled lately.",
  permission: "cables.readUnapproved",
  answer: { status: 200, description: "The queue.", schema: queueSchema },
});

export const countReviews = operation({
  id: "countReviews",
  method: "GET",
  path: "/review/waiting",
  summary: "How many revisions wait for a reviewer; 0 for those who do not review.",
  permission: "cables.read",
  answer: { status: 200, description: "The count.", schema: waitingCountSchema },
});
