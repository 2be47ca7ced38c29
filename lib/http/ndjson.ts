/** Long work told line by line: what has been done while it goes on, then its answer or why there is none. */
import { problemOf } from "@/lib/http/errors";

const mediaType = "application/x-ndjson";

export function wantsLines(request: Request): boolean {
  return (request.headers.get("accept") ?? "").includes(mediaType);
}

/**
 * @param work - told where to say how far it is
 * @returns lines of JSON: `{progress}` as often as it is said, then one of `{report}` and `{problem}`
 */
export function linesOf<Progress>(work: (told: (progress: Progress) => void) => Promise<unknown>): Response {
  const encoder = new TextEncoder();
  let isOpen = true;
  const lines = new ReadableStream<Uint8Array>({
    async start(controller) {
      const say = (line: unknown) => {
        if (isOpen) controller.enqueue(encoder.encode(`${JSON.stringify(line)}\n`));
      };
      try {
        say({ report: await work((progress) => say({ progress })) });
      } catch (error) {
        say({ problem: await problemOf(error).json() });
      }
      if (isOpen) controller.close();
    },
    cancel() {
      isOpen = false;
    },
  });
  return new Response(lines, { headers: { "Content-Type": mediaType, "Cache-Control": "no-store" } });
}
