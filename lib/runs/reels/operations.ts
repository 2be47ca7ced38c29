/** What can be asked of a run's reels. */
import { operation } from "@/lib/http/operation";
import { newReelSchema, reelListSchema } from "@/lib/runs/reels/schema";

export const listReelsOperation = operation({
  id: "listReels",
  method: "GET",
  path: "/runs/{runId}/reels",
  summary: "The measured reels a run is to be cut from.",
  permission: "runs.read",
  answer: { status: 200, description: "The reels, at most one for each cable.", schema: reelListSchema },
});

export const bindReelOperation = operation({
  id: "bindReel",
  method: "POST",
  path: "/runs/{runId}/reels",
  summary: "Bind a run to a reel of a cable it uses.",
  permission: "runs.write",
  body: newReelSchema,
  answer: { status: 200, description: "The reels as they now stand.", schema: reelListSchema },
  refusals: ["conflict"],
});

export const freeReelOperation = operation({
  id: "freeReel",
  method: "DELETE",
  path: "/runs/{runId}/reels/{lotId}",
  summary: "Take a reel from a run.",
  permission: "runs.write",
  answer: { status: 204, description: "The run is not bound to it." },
});
