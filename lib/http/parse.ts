/** Checking untyped input against a schema, and telling every fault of it at its place, in the house's words. Pure. */
import type { z } from "zod";
import { AppError, type FieldErrors } from "@/lib/http/errors";

type RawIssue = Parameters<NonNullable<z.core.ParseContext<z.core.$ZodIssue>["error"]>>[0];

const most = 500;

/** The sentence for a fault whose schema has none of its own. */
export function plainSentence(issue: RawIssue): string {
  if (issue.code === "invalid_type")
    return issue.input === undefined ? "This is needed." : `This must be ${nounOf(issue.expected)}.`;
  if (issue.code === "unrecognized_keys") return "There is no such field here.";
  if (issue.code === "too_small")
    return `This must be ${issue.inclusive ? "at least" : "more than"} ${bound(issue.minimum, issue.origin)}.`;
  if (issue.code === "too_big")
    return `This must be ${issue.inclusive ? "at most" : "less than"} ${bound(issue.maximum, issue.origin)}.`;
  if (issue.code === "invalid_value") return `This must be one of ${issue.values.map(String).join(", ")}.`;
  return "This is not as it should be.";
}

const nouns: Record<string, string> = {
  number: "a number",
  int: "a whole number",
  string: "text",
  boolean: "true or false",
  array: "a list",
  tuple: "a list",
  object: "an object",
};
const nounOf = (expected: string) => nouns[expected] ?? `a ${expected}`;

function bound(limit: number | bigint, origin: string): string {
  if (origin === "string") return `${limit} characters long`;
  return origin === "array" ? `${limit} items long` : String(limit);
}

/** Of a union's alternatives the one that was meant: nothing wrong with its shape, only with what is in it. */
function meantAlternative(alternatives: z.core.$ZodIssue[][]): z.core.$ZodIssue[] | undefined {
  return alternatives
    .filter((issues) => issues.every((issue) => issue.path.length > 0 && issue.code !== "unrecognized_keys"))
    .sort((a, b) => a.length - b.length)[0];
}

function flattened(issues: z.core.$ZodIssue[], before: PropertyKey[] = []): { path: string; message: string }[] {
  return issues.flatMap((issue) => {
    const path = [...before, ...issue.path];
    if (issue.code === "unrecognized_keys")
      return issue.keys.map((key) => ({ path: [...path, key].join("."), message: "There is no such field here." }));
    const meant = issue.code === "invalid_union" ? meantAlternative(issue.errors) : undefined;
    return meant ? flattened(meant, path) : [{ path: path.join("."), message: issue.message }];
  });
}

/** The sentences of a failed check by dotted path; an empty path is the whole. */
export function fieldErrorsOf(error: z.core.$ZodError): FieldErrors {
  // A map first: a path may be called __proto__, and then assigning to it would not make a field.
  const fields = new Map<string, string[]>();
  for (const { path, message } of flattened(error.issues).slice(0, most)) {
    const sentences = fields.get(path) ?? [];
    if (!sentences.includes(message)) fields.set(path, [...sentences, message]);
  }
  return Object.fromEntries(fields);
}

/**
 * The input as the schema reads it.
 * @throws AppError `invalid_input` with a sentence at every field that is wrong (the first 500)
 */
export function parse<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const read = schema.safeParse(input, { error: plainSentence });
  if (read.success) return read.data;
  const fields = fieldErrorsOf(read.error);
  const count = Object.keys(fields).length;
  throw new AppError(
    "invalid_input",
    count === 1 ? "One field is not right." : `${count} fields are not right.`,
    fields,
  );
}
