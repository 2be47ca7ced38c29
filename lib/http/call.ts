/** Calls of the browser to the API: one place that knows what a refusal looks like. */

/** Names the person a page was made for. */
export const madeForHeader = "Page-Made-For";

export interface Problem {
  title: string;
  status: number;
  detail: string;
  errors?: { path: string; message: string }[];
  /** with 412: the thing as it now stands */
  current?: unknown;
}

/** The server refused. `problem.detail` is a sentence for the person who asked. */
export class ProblemError extends Error {
  readonly problem: Problem;
  constructor(problem: Problem) {
    super(problem.detail);
    this.name = "ProblemError";
    this.problem = problem;
  }
}

/** The server could not be reached: no answer at all. */
export class AwayError extends Error {
  constructor() {
    super("Ropewalk cannot be reached.");
    this.name = "AwayError";
  }
}

let speaker: string | undefined;

/** Who the page was made for: a change is refused where somebody else has signed in since, in another tab. */
export function speakFor(personId: string): void {
  speaker = personId;
}

interface Call {
  method?: "GET" | "POST" | "PATCH" | "DELETE";
  body?: unknown;
  ifMatch?: string;
  signal?: AbortSignal;
}

/**
 * @param path - under /api/v1, with its leading slash
 * @returns the JSON answer, undefined where there is none
 * @throws ProblemError, AwayError
 */
export async function call<T>(path: string, { method = "GET", body, ifMatch, signal }: Call = {}): Promise<T> {
  const headers: Record<string, string> = {};
  if (body !== undefined) headers["Content-Type"] = "application/json";
  if (ifMatch !== undefined) headers["If-Match"] = ifMatch;
  if (speaker !== undefined && method !== "GET") headers[madeForHeader] = speaker;
  // No answer, or one cut off on its way.
  const broken = (error: unknown): never => {
    if (signal?.aborted) throw error;
    throw new AwayError();
  };
  const response = await fetch(`/api/v1${path}`, {
    method,
    headers,
    body: body === undefined ? undefined : JSON.stringify(body),
    signal,
  }).catch(broken);
  const isJson = /json/.test(response.headers.get("Content-Type") ?? "");
  const answer: unknown = isJson ? await response.json().catch(broken) : undefined;
  if (response.ok) return answer as T;
  throw new ProblemError(
    (answer as Problem | undefined) ?? {
      title: "No answer",
      status: response.status,
      detail: "The server did not answer as expected. Try again in a moment.",
    },
  );
}
