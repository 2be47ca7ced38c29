import { operations } from "@/lib/http/all-operations";
import { handlePublic, route } from "@/lib/http/handle";
import { openApiDocument } from "@/lib/http/openapi";
import { readDescription } from "@/lib/http/operations";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handlePublic(readDescription, () => Response.json(openApiDocument(operations))),
});
