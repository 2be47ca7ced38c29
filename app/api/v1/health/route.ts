import { checkDatabase } from "@/lib/http/health/service";
import { handlePublic, route } from "@/lib/http/handle";
import { readHealth } from "@/lib/http/operations";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handlePublic(readHealth, () => {
    checkDatabase();
    return Response.json({ status: "ok" }, { headers: { "Cache-Control": "no-store" } });
  }),
});
