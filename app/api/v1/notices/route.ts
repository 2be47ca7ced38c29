import { handle, route } from "@/lib/http/handle";
import { pageResponse } from "@/lib/http/list";
import { listNotices } from "@/lib/notices/inbox/service";
import { listOwnNotices } from "@/lib/notices/operations";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listOwnNotices, ({ actor, request, query }) => pageResponse(request, listNotices(actor, query))),
});
