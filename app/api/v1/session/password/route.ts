import { changeOwnPassword } from "@/lib/auth/operations";
import { changePassword } from "@/lib/auth/service";
import { handle, route } from "@/lib/http/handle";
import { networkAddress } from "@/lib/http/origin";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(changeOwnPassword, async ({ actor, request, body }) => {
    await changePassword(actor, await body(), networkAddress(request));
    return new Response(null, { status: 204 });
  }),
});
