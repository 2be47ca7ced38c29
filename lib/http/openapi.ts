/** The OpenAPI 3.1 description, made from the operations and the zod schemas that check the requests. Pure. */
import { z } from "zod";
import { type ErrorCode, problemSchema, statusOf, titleOf } from "@/lib/http/errors";
import type { Operation } from "@/lib/http/operation";
import { SchemaParts, type Json } from "@/lib/http/schema-parts";

const base = "/api/v1";

/** The refusals an operation can answer, from what it asks. */
export function refusalsOf(declared: Operation): ErrorCode[] {
  const codes = new Set<ErrorCode>(declared.refusals);
  if (declared.permission !== null) codes.add("unauthenticated").add("forbidden");
  if (declared.path.includes("{")) codes.add("not_found");
  if (declared.body || declared.accepts)
    codes.add("malformed").add("too_large").add("unsupported_media_type").add("invalid_input");
  if (declared.query) codes.add("invalid_input");
  if (declared.needsMatch) codes.add("precondition_required").add("stale");
  return [...codes].sort((a, b) => statusOf[a] - statusOf[b]);
}

const pathParameters = (path: string): Json[] =>
  [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({
    name,
    in: "path",
    required: true,
    schema: { type: "string" },
  }));

function queryParameters(query: z.ZodType): Json[] {
  const made = z.toJSONSchema(query, { io: "input" }) as { properties?: Record<string, Json>; required?: string[] };
  return Object.entries(made.properties ?? {}).map(([name, { description, ...schema }]) => ({
    name,
    in: "query",
    required: made.required?.includes(name) ?? false,
    ...(description !== undefined && { description }),
    schema,
  }));
}

const ifMatch: Json = {
  name: "If-Match",
  in: "header",
  required: true,
  description: "the ETag of the version that was changed",
  schema: { type: "string" },
};
const entityTagHeader: Json = { description: "the version, for If-Match", schema: { type: "string" } };

function responses(declared: Operation, parts: SchemaParts): Json {
  const { status, description, schema, hasEntityTag } = declared.answer;
  const json = schema ? parts.reference(schema, "output") : { type: "object" };
  const mediaTypes = [declared.answer.mediaType ?? "application/json"].flat();
  const content = mediaTypes.map((type) => [type, { schema: type === "application/json" ? json : { type: "string" } }]);
  const answers: Json = {
    [status]: {
      description,
      ...(hasEntityTag && { headers: { ETag: entityTagHeader } }),
      ...(status !== 204 && { content: Object.fromEntries(content) as Json }),
    },
  };
  const problem = { "application/problem+json": { schema: parts.reference(problemSchema, "output") } };
  for (const code of refusalsOf(declared)) answers[statusOf[code]] = { description: titleOf[code], content: problem };
  return answers;
}

/** The body of a request: JSON by its schema, or what the route accepts by media type. */
function requestBody({ body, accepts, mostBodyBytes }: Operation, parts: SchemaParts): Json {
  const types = Object.entries(body ? { "application/json": body } : (accepts ?? {}));
  const content = types.map(([type, schema]) => [type, { schema: parts.reference(schema, "input") }]);
  const most = mostBodyBytes && { description: `At most ${Math.round(mostBodyBytes / 1_048_576)} MB.` };
  return { required: true, ...most, content: Object.fromEntries(content) as Json };
}

function describe(declared: Operation, parts: SchemaParts): Json {
  const parameters = [
    ...pathParameters(declared.path),
    ...(declared.query ? queryParameters(declared.query) : []),
    ...(declared.needsMatch ? [ifMatch] : []),
  ];
  return {
    operationId: declared.id,
    summary: declared.summary,
    tags: [declared.path.split("/")[1]],
    security: declared.permission === null ? [] : [{ cookie: [] }, { token: [] }],
    ...(parameters.length > 0 && { parameters }),
    ...((declared.body || declared.accepts) && { requestBody: requestBody(declared, parts) }),
    responses: responses(declared, parts),
  };
}

/** The description of the operations given. */
export function openApiDocument(operations: Operation[]): Json {
  const parts = new SchemaParts();
  const paths: Record<string, Json> = {};
  for (const declared of operations) {
    const path = (paths[declared.path] ??= {});
    path[declared.method.toLowerCase()] = describe(declared, parts);
  }
  return {
    openapi: "3.1.0",
    info: {
      title: "Ropewalk",
      version: "1",
      description:
        "SI units, named in the keys. A complex quantity is { re, im }. A value that has no finite number is null. " +
        "Errors are RFC 9457 problem documents. A body has at most 1 MB unless its operation says otherwise.",
    },
    servers: [{ url: base }],
    paths,
    components: {
      schemas: parts.schemas,
      securitySchemes: {
        cookie: { type: "apiKey", in: "cookie", name: "ropewalk-session" },
        token: { type: "http", scheme: "bearer" },
      },
    },
  };
}
