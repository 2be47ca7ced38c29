/** How computing says no: faults of a request at their paths, and what the engine itself refuses. */
import { AppError } from "@/lib/http/errors";
import type { CircuitFault } from "@/lib/runs/circuit";

/** @throws AppError `invalid_input` where there is a fault */
export function refuse(faults: CircuitFault[]): void {
  if (faults.length === 0) return;
  const fields = Object.fromEntries(faults.map(({ path, message }) => [path, [message]]));
  throw new AppError("invalid_input", "This cannot be computed as asked.", fields);
}

/** The engine refuses with a RangeError what no schema foresaw; for the caller that is input like any other. */
export async function computed<Answer>(answer: Promise<Answer>): Promise<Answer> {
  try {
    return await answer;
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw new AppError("invalid_input", `This cannot be computed: ${error.message.replace(/^\w+: /, "")}.`);
  }
}
