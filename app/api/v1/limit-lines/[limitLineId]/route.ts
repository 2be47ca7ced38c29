import { handle, route } from "@/lib/http/handle";
import { dropLimitLine } from "@/lib/limit-lines/operations";
import { removeLimitLine } from "@/lib/limit-lines/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  DELETE: handle(dropLimitLine, ({ actor, params }) => {
    removeLimitLine(actor, params.limitLineId);
    return new Response(null, { status: 204 });
  }),
});
