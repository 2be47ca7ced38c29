import { listImportsOperation } from "@/lib/cables/exchange/operations";
import { listImports } from "@/lib/cables/imports/kept/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listImportsOperation, ({ actor }) =>
    Response.json(listImports(actor), { headers: { "Cache-Control": "no-store" } }),
  ),
});
