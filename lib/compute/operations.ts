/** What can be asked of `/compute`. Nothing is stored. */
import { matchesAnswerSchema, matchesRequestSchema } from "@/lib/compute/matches/schema";
import * as schemas from "@/lib/compute/schema";
import { operation } from "@/lib/http/operation";

const computing = { method: "POST", permission: "compute.use" } as const;

export const lineOperation = operation({
  ...computing,
  id: "computeLine",
  path: "/compute/line",
  summary: "One cable per metre over frequency.",
  body: schemas.lineRequestSchema,
  answer: { status: 200, description: "Primary and secondary parameters.", schema: schemas.lineAnswerSchema },
});

export const sweepOperation = operation({
  ...computing,
  id: "computeSweep",
  path: "/compute/sweep",
  summary: "A run over frequency, at any plane.",
  body: schemas.sweepRequestSchema,
  answer: { status: 200, description: "The sweep.", schema: schemas.sweepAnswerSchema },
});

export const profileOperation = operation({
  ...computing,
  id: "computeProfile",
  path: "/compute/profile",
  summary: "Voltage and current along a run at one frequency, and where the power goes.",
  body: schemas.profileRequestSchema,
  answer: { status: 200, description: "The standing wave.", schema: schemas.profileAnswerSchema },
});

export const matchesOperation = operation({
  ...computing,
  id: "computeMatches",
  path: "/compute/matches",
  summary: "Ways to match a load with the cables at hand, judged over a band.",
  body: matchesRequestSchema,
  answer: {
    status: 200,
    description: "The candidates, and the methods that cannot work.",
    schema: matchesAnswerSchema,
  },
});
