import { settleCableReport } from "@/lib/cables/comments/operations";
import { getReport, settleReport } from "@/lib/cables/reports/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(settleCableReport, async ({ actor, params: { cableId, reportId }, body }) => {
    getReport(actor, cableId, reportId);
    return Response.json(settleReport(actor, cableId, reportId, await body()));
  }),
});
