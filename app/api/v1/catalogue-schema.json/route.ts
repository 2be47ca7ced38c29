import { catalogueJsonSchema } from "@/lib/cables/exchange/catalogue";
import { catalogueSchemaOperation } from "@/lib/cables/exchange/operations";
import { handlePublic, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handlePublic(catalogueSchemaOperation, () => Response.json(catalogueJsonSchema())),
});
