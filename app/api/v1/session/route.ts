import { clearedCookie, sealedCookie } from "@/lib/auth/cookie";
import { endSession, openSession, readSession } from "@/lib/auth/operations";
import { signIn, signOut } from "@/lib/auth/service";
import { handle, handlePublic, route } from "@/lib/http/handle";
import { networkAddress, refuseOtherPage } from "@/lib/http/origin";
import { describeActor } from "@/lib/team/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readSession, ({ actor }) =>
    Response.json(describeActor(actor), { headers: { "Cache-Control": "no-store" } }),
  ),

  POST: handlePublic(openSession, async ({ request, body }) => {
    refuseOtherPage(request);
    const { key, actor } = await signIn(await body(), networkAddress(request));
    return Response.json(describeActor(actor), { headers: { "Set-Cookie": await sealedCookie(key, request.headers) } });
  }),

  DELETE: handle(endSession, ({ actor, request }) => {
    signOut(actor);
    return new Response(null, { status: 204, headers: { "Set-Cookie": clearedCookie(request.headers) } });
  }),
});
