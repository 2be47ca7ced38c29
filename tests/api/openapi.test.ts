import { beforeAll, describe, expect, test } from "vitest";
import { GET } from "@/app/api/v1/openapi.json/route";
import { operations } from "@/lib/http/all-operations";
import type { Method } from "@/lib/http/operation";
import { jsonOf, send } from "@/tests/support/requests";
import { type RouteFile, routeFiles } from "@/tests/support/routes";

interface Described {
  operationId: string;
  security: unknown[];
  responses: Record<string, { content?: Record<string, { schema: unknown }> }>;
  requestBody?: unknown;
  parameters?: { name: string; in: string; required: boolean }[];
}
interface Document {
  openapi: string;
  paths: Record<string, Record<string, Described>>;
  components: { schemas: Record<string, unknown> };
}

const methods: Method[] = ["GET", "POST", "PUT", "PATCH", "DELETE"];
let document: Document;
let files: RouteFile[];
beforeAll(async () => {
  document = await jsonOf<Document>(await send(GET, "GET"));
  files = await routeFiles();
});

test("Every verb of every route file is in the description, under its own path", () => {
  const served = files.flatMap(({ path, handlers }) =>
    methods.flatMap((method) => (handlers[method]?.operation ? [`${method} ${path}`] : [])),
  );
  const described = Object.entries(document.paths).flatMap(([path, verbs]) =>
    Object.keys(verbs).map((verb) => `${verb.toUpperCase()} ${path}`),
  );
  expect(served.sort()).toEqual(described.sort());
  expect(served).toContain("PATCH /runs/{runId}");
});

test("Every handler answers for the operation of its own path and verb", () => {
  for (const { path, handlers } of files)
    for (const method of methods) {
      const operation = handlers[method]?.operation;
      if (operation) expect({ path: operation.path, method: operation.method }).toEqual({ path, method });
    }
});

test("Every route file exports every verb, so that what it lacks is refused in the house's way", () => {
  for (const { path, handlers } of files)
    expect(Object.keys(handlers).sort(), path).toEqual([...methods, "OPTIONS"].sort());
});

test("It is OpenAPI 3.1 and needs no sign-in", () => {
  expect(document.openapi).toMatch(/^3\.1\./);
});

test("Every reference in it leads to a schema in it", () => {
  const references = [...JSON.stringify(document).matchAll(/"\$ref":"([^"]+)"/g)].map(([, to]) => to ?? "");
  expect(references.length).toBeGreaterThan(20);
  for (const reference of references)
    expect(document.components.schemas).toHaveProperty(reference.replace("#/components/schemas/", ""));
});

test("It carries no trace of how it was made: no $id, no $schema", () => {
  expect(JSON.stringify(document)).not.toMatch(/"\$(id|schema|defs)"/);
});

describe.each(operations.map((operation) => [operation.id, operation] as const))("%s", (_, operation) => {
  const described = () => document.paths[operation.path]?.[operation.method.toLowerCase()];

  test("says what it answers, and which refusals", () => {
    const { responses } = described() ?? { responses: {} };
    expect(responses).toHaveProperty(String(operation.answer.status));
    for (const [status, { content }] of Object.entries<Described["responses"][string]>(responses))
      if (Number(status) >= 400) expect(content).toHaveProperty(["application/problem+json"]);
    if (operation.permission !== null) expect(responses).toHaveProperty("401");
    if (operation.body ?? operation.accepts)
      for (const status of ["400", "413", "415", "422"]) expect(responses).toHaveProperty(status);
    if (operation.needsMatch) for (const status of ["412", "428"]) expect(responses).toHaveProperty(status);
  });

  test("names the parameters of its path, and its body where it has one", () => {
    const inPath = [...operation.path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
    const parameters = described()?.parameters ?? [];
    expect(parameters.filter((one) => one.in === "path").map(({ name }) => name)).toEqual(inPath);
    expect(described()?.requestBody !== undefined).toBe((operation.body ?? operation.accepts) !== undefined);
  });
});

test("Every schema's keys that hold a physical quantity name their unit or are dimensionless by name", () => {
  const text =
    JSON.stringify(document.components.schemas.Circuit) + JSON.stringify(document.components.schemas.LineModel);
  expect(text).not.toMatch(/"(length|frequency|resistance|inductance|capacitance)"/);
});
