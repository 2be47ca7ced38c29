import { handle, route } from "@/lib/http/handle";
import { pageResponse } from "@/lib/http/list";
import { listLetters } from "@/lib/mail/letters/service";
import { readLetters } from "@/lib/mail/operations";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readLetters, ({ actor, request, query }) => pageResponse(request, listLetters(actor, query))),
});
