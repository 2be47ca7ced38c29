import { searchCatalogue } from "@/lib/cables/operations";
import { listCables } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";
import { pageResponse } from "@/lib/http/list";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(searchCatalogue, ({ actor, request, query }) => pageResponse(request, listCables(actor, query))),
});
