import { describe, expect, test, vi } from "vitest";
import { z } from "zod";
import { AppError, problemOf } from "@/lib/http/errors";
import { emptyForm, formFailure, formValues } from "@/lib/http/form-state";
import { parse } from "@/lib/http/parse";

const refusal = (schema: z.ZodType, input: unknown): AppError => {
  try {
    parse(schema, input);
  } catch (error) {
    if (error instanceof AppError) return error;
  }
  throw new Error("it was not refused");
};
const fieldsOf = (schema: z.ZodType, input: unknown) => refusal(schema, input).fields;

describe("parse(schema, input)", () => {
  test("gives what the schema makes of the input", () => {
    expect(parse(z.object({ a: z.string().trim().default("x") }), {})).toEqual({ a: "x" });
  });

  test.each<[string, z.ZodType, unknown, string]>([
    ["a missing field", z.number(), undefined, "This is needed."],
    ["text for a number", z.number(), "1", "This must be a number."],
    ["half a whole number", z.int(), 1.5, "This must be a whole number."],
    ["too little", z.number().min(3), 2, "This must be at least 3."],
    ["not enough", z.number().gt(3), 3, "This must be more than 3."],
    ["too much", z.number().max(3), 4, "This must be at most 3."],
    ["too short a text", z.string().min(3), "a", "This must be at least 3 characters long."],
    ["too long a list", z.array(z.number()).max(1), [1, 2], "This must be at most 1 items long."],
    ["another value", z.enum(["a", "b"]), "c", "This must be one of a, b."],
    [
      "what has a sentence of its own",
      z.number({ error: "The length must be a number." }),
      "x",
      "The length must be a number.",
    ],
  ])("says in the house's words what is wrong with %s", (_, schema, input, sentence) => {
    expect(fieldsOf(z.object({ field: schema }), { field: input })).toEqual({ field: [sentence] });
  });

  test("names every field that is not there under its own path", () => {
    const schema = z.strictObject({ inner: z.strictObject({}) });
    expect(Object.keys(fieldsOf(schema, { inner: { a: 1, b: 2 }, c: 3 })).sort()).toEqual(["c", "inner.a", "inner.b"]);
  });

  test("looks into the alternative that was meant, and names the whole when none was", () => {
    const schema = z.object({
      line: z.union(
        [z.strictObject({ cable: z.string() }), z.strictObject({ model: z.strictObject({ c: z.number() }) })],
        {
          error: "A line is a cable or a model.",
        },
      ),
    });
    expect(fieldsOf(schema, { line: { model: { c: "x" } } })).toEqual({ "line.model.c": ["This must be a number."] });
    expect(fieldsOf(schema, { line: 7 })).toEqual({ line: ["A line is a cable or a model."] });
    expect(fieldsOf(schema, { line: { other: 1 } })).toEqual({ line: ["A line is a cable or a model."] });
  });

  test("makes a field of __proto__ instead of following it", () => {
    const fields = fieldsOf(z.strictObject({}), JSON.parse('{"__proto__": 1}'));
    expect(Object.keys(fields)).toEqual(["__proto__"]);
  });

  test("stops naming faults where nobody would read on", () => {
    const fields = fieldsOf(
      z.array(z.number()),
      Array.from({ length: 5000 }, () => "x"),
    );
    expect(Object.keys(fields)).toHaveLength(500);
  });
});

describe("problemOf(thrown)", () => {
  test("is a problem document for a refusal", async () => {
    const error = new AppError(
      "stale",
      "Too late.",
      { name: ["One.", "Two."] },
      { members: { current: 1 }, headers: { ETag: '"2"' } },
    );
    const answer = problemOf(error);
    expect([answer.status, answer.headers.get("content-type"), answer.headers.get("etag")]).toEqual([
      412,
      "application/problem+json",
      '"2"',
    ]);
    expect(await answer.json()).toEqual({
      ...{
        type: "about:blank",
        title: "Precondition Failed",
        status: 412,
        code: "stale",
        detail: "Too late.",
        current: 1,
      },
      errors: [
        { path: "name", message: "One." },
        { path: "name", message: "Two." },
      ],
    });
  });

  test("is a fixed sentence for a fault of ours, which is logged and not shown", async () => {
    vi.mocked(console.error).mockImplementation(() => undefined);
    const fault = new Error("secret detail of the database");
    const answer = problemOf(fault);
    expect(answer.status).toBe(500);
    expect(await answer.text()).not.toContain("secret");
    expect(vi.mocked(console.error).mock.calls).toEqual([[fault]]);
    vi.mocked(console.error).mockClear();
  });
});

describe("A form", () => {
  const form = new FormData();
  form.set("name", "Mast");
  form.set("password", "hush");
  form.set("$ACTION_ID_1", "x");
  form.set("file", new Blob(["x"]));

  test("has its texts read, without what React adds", () => {
    expect(formValues(form)).toEqual({ name: "Mast", password: "hush" });
  });

  test("gets a refusal back with what was typed, but for passwords", () => {
    const state = formFailure(new AppError("invalid_input", "No.", { name: ["Taken."] }), form);
    expect(state).toEqual({ message: "No.", fields: { name: ["Taken."] }, values: { name: "Mast" } });
    expect(emptyForm).toEqual({ fields: {}, values: {} });
  });

  test("does not take a fault of ours for a refusal", () => {
    expect(() => formFailure(new TypeError("x"), form)).toThrow(TypeError);
  });
});
