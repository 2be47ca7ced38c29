/** Files that the browser sends to the API: as they are, or in a form; the answer whole, or line by line. */
import { AwayError, ProblemError, type Problem } from "@/lib/http/call";

async function sent(path: string, body: BodyInit, headers: Record<string, string>, signal?: AbortSignal) {
  const response = await fetch(`/api/v1${path}`, { method: "POST", headers, body, signal }).catch((error: unknown) => {
    if (signal?.aborted) throw error;
    throw new AwayError();
  });
  if (response.ok) return response;
  const problem = (await response.json().catch(() => undefined)) as Problem | undefined;
  const { status } = response;
  const detail = "The server did not answer as expected. Try again in a moment.";
  throw new ProblemError(problem ?? { title: "No answer", status, detail });
}

/**
 * Sends a form with its files.
 * @throws ProblemError, AwayError
 */
export async function sendForm<T>(path: string, form: FormData): Promise<T> {
  return (await sent(path, form, {})).json() as Promise<T>;
}

type Line<Progress, Report> = { progress: Progress } | { report: Report } | { problem: Problem };

/**
 * Sends a file and is told how far the work is.
 * @throws ProblemError, AwayError, also where the answer is cut off
 */
export async function sendFile<Progress, Report>(
  path: string,
  file: { body: Blob; mediaType: string },
  told: (progress: Progress) => void,
  signal?: AbortSignal,
): Promise<Report> {
  const headers = { "Content-Type": file.mediaType, Accept: "application/x-ndjson" };
  const response = await sent(path, file.body, headers, signal);
  let rest = "";
  const decoder = new TextDecoder();
  const reader = response.body?.getReader();
  for (let step = await reader?.read(); step && !step.done; step = await reader?.read()) {
    rest += decoder.decode(step.value, { stream: true });
    const lines = rest.split("\n");
    rest = lines.pop() ?? "";
    for (const text of lines) {
      const line = JSON.parse(text) as Line<Progress, Report>;
      if ("report" in line) return line.report;
      if ("problem" in line) throw new ProblemError(line.problem);
      told(line.progress);
    }
  }
  throw new AwayError();
}
