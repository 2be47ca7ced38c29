import { profileOperation } from "@/lib/compute/operations";
import { computeProfile } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(profileOperation, async ({ actor, body }) => Response.json(computeProfile(actor, await body()))),
});
