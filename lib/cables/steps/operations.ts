/** The steps that can be taken with an entry. Each needs the ETag of the revision it is taken with. */
import type { z } from "zod";
import type { Permission } from "@/lib/auth/permission";
import { cableRevisionSchema } from "@/lib/cables/revisions/schema";
import * as given from "@/lib/cables/steps/schema";
import { operation } from "@/lib/http/operation";

interface Step<Path extends string, Body extends z.ZodType> {
  id: string;
  path: Path;
  summary: string;
  body: Body;
  permission?: Permission;
}

const step = <const Path extends string, Body extends z.ZodType>({
  permission = "cables.review",
  ...declared
}: Step<Path, Body>) =>
  operation({
    ...declared,
    method: "POST",
    permission,
    needsMatch: true,
    answer: { status: 200, description: "The revision after it.", schema: cableRevisionSchema, hasEntityTag: true },
    refusals: ["conflict"],
  });

export const submitCable = step({
  id: "submitCable",
  path: "/cables/{cableId}/submit",
  summary: "Send the open draft to the reviewers; by its author.",
  permission: "cables.propose",
  body: given.submitSchema,
});

export const approveCable = step({
  id: "approveCable",
  path: "/cables/{cableId}/approve",
  summary: "Approve the revision in review; never one's own while the house rule of two persons holds.",
  body: given.approveSchema,
});

export const returnCable = step({
  id: "returnCable",
  path: "/cables/{cableId}/return",
  summary: "Return the revision in review to its author, with notes.",
  body: given.returnSchema,
});

export const restrictCable = step({
  id: "restrictCable",
  path: "/cables/{cableId}/restrict",
  summary: "Let the current revision be used under a condition only.",
  body: given.restrictSchema,
});

export const quarantineCable = step({
  id: "quarantineCable",
  path: "/cables/{cableId}/quarantine",
  summary: "Keep the current revision from being used anew; runs that use it stay readable.",
  body: given.quarantineSchema,
});

export const releaseCable = step({
  id: "releaseCable",
  path: "/cables/{cableId}/release",
  summary: "Lift a restriction or end a quarantine; what was never approved becomes its author's draft again.",
  body: given.releaseSchema,
});

export const supersedeCable = step({
  id: "supersedeCable",
  path: "/cables/{cableId}/supersede",
  summary: "Name the entry that takes the place of this one.",
  body: given.supersedeSchema,
});

export const withdrawCable = step({
  id: "withdrawCable",
  path: "/cables/{cableId}/withdraw",
  summary: "Take an entry out of use for good.",
  body: given.withdrawSchema,
});

export const preferCable = step({
  id: "preferCable",
  path: "/cables/{cableId}/prefer",
  summary: "Mark an entry as one to take before others, or take the mark away.",
  body: given.preferSchema,
});
