import { geometryOperation } from "@/lib/compute/geometry/operations";
import { computeGeometry } from "@/lib/compute/geometry/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(geometryOperation, async ({ actor, body }) => jsonAnswer(await computeGeometry(actor, await body()))),
});
