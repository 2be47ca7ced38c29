/** What can be said of an entry: comments, reports of a problem, and how those are settled. */
import { cableCommentSchema, cableCommentsSchema, newCableCommentSchema } from "@/lib/cables/comments/schema";
import { newReportSchema, reportSchema, reportsSchema, settleSchema } from "@/lib/cables/reports/schema";
import { operation } from "@/lib/http/operation";

export const readCableComments = operation({
  id: "listCableComments",
  method: "GET",
  path: "/cables/{cableId}/comments",
  summary: "What was said of the revisions that one may read, oldest first.",
  permission: "cables.read",
  answer: { status: 200, description: "The comments.", schema: cableCommentsSchema },
});

export const sayOfCable = operation({
  id: "addCableComment",
  method: "POST",
  path: "/cables/{cableId}/comments",
  summary: "Say something of a revision.",
  permission: "cables.comment",
  body: newCableCommentSchema,
  answer: { status: 201, description: "The comment.", schema: cableCommentSchema },
  refusals: ["conflict"],
});

export const listCableReports = operation({
  id: "listCableReports",
  method: "GET",
  path: "/cables/{cableId}/reports",
  summary: "Problems reported with a cable, newest first; of those who do not review, their own.",
  permission: "cables.read",
  answer: { status: 200, description: "The reports.", schema: reportsSchema },
});

export const reportCable = operation({
  id: "reportCable",
  method: "POST",
  path: "/cables/{cableId}/reports",
  summary: "Report a problem with a cable.",
  permission: "cables.report",
  body: newReportSchema,
  answer: { status: 201, description: "The report.", schema: reportSchema },
  refusals: ["conflict"],
});

export const settleCableReport = operation({
  id: "settleCableReport",
  method: "POST",
  path: "/cables/{cableId}/reports/{reportId}/settle",
  summary: "Settle a report; the outcome `quarantined` quarantines the entry with it.",
  permission: "cables.review",
  body: settleSchema,
  answer: { status: 200, description: "The report.", schema: reportSchema },
  refusals: ["conflict"],
});
