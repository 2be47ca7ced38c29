import { importOperation } from "@/lib/cables/exchange/operations";
import { receiveImport } from "@/lib/cables/imports/receive";
import type { ImportProgress } from "@/lib/cables/imports/service";
import { importCables } from "@/lib/cables/imports/service";
import { handle, route } from "@/lib/http/handle";
import { linesOf, wantsLines } from "@/lib/http/ndjson";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(importOperation, async ({ actor, query, request }) => {
    const file = await receiveImport(request, query);
    if (wantsLines(request)) return linesOf<ImportProgress>((told) => importCables(actor, file, told));
    return Response.json(await importCables(actor, file), { headers: { "Cache-Control": "no-store" } });
  }),
});
