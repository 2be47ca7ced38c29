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
    throw new AppError("invalid_input", `This cannot be computed: ${inWords(error.message)}.`);
  }
}

/** Without the name of the function, and without what is no number: it was too large or undefined, which says less. */
function inWords(message: string): string {
  return message.replace(/^\w+: /, "").replace(/,? got -?(Infinity|NaN)\b/g, "");
}
