import { z } from "zod";

export type Json = Record<string, unknown>;

/** Collects JSON Schemas; every one that has a name of its own is kept once, under it, and referred to. */
export class SchemaParts {
  readonly schemas: Json = {};

  /**
   * @param io - whether the schema is meant as it is sent (`input`, defaults may be left out) or as it is answered
   * @throws Error when two different schemas have one name
   */
  reference(schema: z.ZodType, io: "input" | "output"): Json {
    const { $schema: _, $defs, ...rest } = z.toJSONSchema(schema, { io }) as Json;
    for (const [name, { id: __, $id: ___, ...definition }] of Object.entries(($defs ?? {}) as Record<string, Json>))
      this.keep(name, relinked(definition) as Json);
    return relinked(rest) as Json;
  }

  private keep(name: string, definition: Json): void {
    const kept = this.schemas[name];
    if (kept !== undefined && JSON.stringify(kept) !== JSON.stringify(definition))
      throw new Error(`SchemaParts: two different schemas are called ${name}`);
    this.schemas[name] = definition;
  }
}

function relinked(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(relinked);
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).map(([key, inner]) =>
    key === "$ref" && typeof inner === "string"
      ? [key, inner.replace("#/$defs/", "#/components/schemas/")]
      : [key, relinked(inner)],
  );
  return Object.fromEntries(entries);
}
