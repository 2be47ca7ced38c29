import { extractOperation } from "@/lib/compute/extract/operations";
import { computeExtract } from "@/lib/compute/extract/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(extractOperation, async ({ actor, body }) => Response.json(computeExtract(actor, await body()))),
});
