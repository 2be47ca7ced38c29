import { readImportOperation } from "@/lib/cables/exchange/operations";
import { getImport } from "@/lib/cables/imports/kept/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readImportOperation, ({ actor, params }) =>
    Response.json(getImport(actor, params.importId), { headers: { "Cache-Control": "no-store" } }),
  ),
});
