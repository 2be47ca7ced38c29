import { addLotOperation, listLotsOperation } from "@/lib/cables/lots/operations";
import { receiveLot } from "@/lib/cables/lots/receive";
import { addLot, listLots } from "@/lib/cables/lots/service";
import { requireRecords } from "@/lib/cables/records/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listLotsOperation, ({ actor, params }) => Response.json(listLots(actor, params.cableId))),

  POST: handle(addLotOperation, async ({ actor, params, request }) => {
    requireRecords(actor, params.cableId); // before a single byte is read
    const { lot, file } = await receiveLot(request);
    return Response.json(addLot(actor, params.cableId, lot, file), { status: 201 });
  }),
});
