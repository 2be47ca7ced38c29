import { listCableReports, reportCable } from "@/lib/cables/comments/operations";
import { listReports, report } from "@/lib/cables/reports/service";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listCableReports, ({ actor, params }) => {
    getCable(actor, params.cableId);
    return Response.json({ items: listReports(actor, params.cableId) });
  }),

  POST: handle(reportCable, async ({ actor, params, body }) => {
    getCable(actor, params.cableId);
    return Response.json(report(actor, params.cableId, (await body()).text), { status: 201 });
  }),
});
