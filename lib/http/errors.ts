import { z } from "zod";

/** What can be refused, with its HTTP status: the only place where the two meet. */
export const statusOf = {
  malformed: 400,
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  method_not_allowed: 405,
  conflict: 409,
  stale: 412,
  too_large: 413,
  unsupported_media_type: 415,
  invalid_input: 422,
  precondition_required: 428,
  too_many_requests: 429,
  internal: 500,
  busy: 503,
} as const;

export type ErrorCode = keyof typeof statusOf;

/** Dotted path of the field -> sentences about it. */
export type FieldErrors = Record<string, string[]>;

interface Extra {
  /** headers of the answer */
  headers?: Record<string, string>;
  /** further members of the problem document */
  members?: Record<string, unknown>;
}

/** A refusal that its reader can act on. Anything else thrown is a fault of ours. */
export class AppError extends Error {
  override readonly name = "AppError";

  /**
   * @param code - what kind of refusal, see `statusOf`
   * @param message - a sentence for the person who asked
   * @param fields - sentences by dotted path, for a body of which parts were refused
   */
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly fields: FieldErrors = {},
    readonly extra: Extra = {},
  ) {
    super(message);
  }

  get status(): number {
    return statusOf[this.code];
  }
}

/** What a status is called (RFC 9110, RFC 6585). */
export const titleOf: Record<ErrorCode, string> = {
  malformed: "Bad Request",
  unauthenticated: "Unauthorized",
  forbidden: "Forbidden",
  not_found: "Not Found",
  method_not_allowed: "Method Not Allowed",
  conflict: "Conflict",
  stale: "Precondition Failed",
  too_large: "Content Too Large",
  unsupported_media_type: "Unsupported Media Type",
  invalid_input: "Unprocessable Content",
  precondition_required: "Precondition Required",
  too_many_requests: "Too Many Requests",
  internal: "Internal Server Error",
  busy: "Service Unavailable",
};

export const problemSchema = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    code: z.enum(Object.keys(statusOf) as [ErrorCode, ...ErrorCode[]]),
    detail: z.string().describe("a sentence for people"),
    errors: z
      .array(z.object({ path: z.string().describe("dotted; empty for the whole body"), message: z.string() }))
      .optional()
      .describe("all that is wrong with a body, at once"),
  })
  .meta({
    id: "Problem",
    description: "RFC 9457. A stale change also carries the resource as it now stands, under `current`.",
  });

/** The problem document (RFC 9457) of a refusal. */
export function problem(error: AppError): Response {
  const errors = Object.entries(error.fields).flatMap(([path, messages]) =>
    messages.map((message) => ({ path, message })),
  );
  const body = {
    ...error.extra.members,
    type: "about:blank",
    title: titleOf[error.code],
    status: error.status,
    code: error.code,
    detail: error.message,
    ...(errors.length > 0 && { errors }),
  };
  return new Response(JSON.stringify(body), {
    status: error.status,
    headers: { "Content-Type": "application/problem+json", "Cache-Control": "no-store", ...error.extra.headers },
  });
}

/** Whether the database was held by somebody else for longer than it is waited for. */
function isBusy(thrown: unknown): boolean {
  return thrown instanceof Error && "code" in thrown && /^SQLITE_(BUSY|LOCKED)/.test(String(thrown.code));
}

/** Whatever was thrown, as an answer. What is not an `AppError` is a bug: it is logged and told as a fixed sentence. */
export function problemOf(thrown: unknown): Response {
  if (thrown instanceof AppError) return problem(thrown);
  if (isBusy(thrown))
    return problem(
      new AppError(
        "busy",
        "Somebody else is writing just now. Nothing was changed; try again in a moment.",
        {},
        {
          headers: { "Retry-After": "5" },
        },
      ),
    );
  console.error(thrown);
  return problem(new AppError("internal", "Something went wrong on our side. Nothing was changed."));
}
