/** What can be asked about the service itself. */
import { z } from "zod";
import { operation } from "@/lib/http/operation";

export const readHealth = operation({
  id: "readHealth",
  method: "GET",
  path: "/health",
  summary: "Whether the service answers and its database can be read.",
  permission: null,
  answer: {
    status: 200,
    description: "All is well.",
    schema: z.strictObject({ status: z.literal("ok") }).meta({ id: "Health" }),
  },
});

export const readDescription = operation({
  id: "readDescription",
  method: "GET",
  path: "/openapi.json",
  summary: "This description.",
  permission: null,
  answer: { status: 200, description: "An OpenAPI 3.1 document." },
});
