import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { touchstoneAnswer } from "@/lib/compute/touchstone/answer";
import { mostFileCharacters, type TouchstoneRequest } from "@/lib/compute/touchstone/schema";
import { AppError } from "@/lib/http/errors";
import { FileFault } from "@/lib/touchstone/network-file";

/** @throws AppError `too_large`, or `invalid_input` that carries the line as `line` */
export function computeTouchstone(actor: Actor, request: TouchstoneRequest) {
  requirePermission(actor, "compute.use");
  if (request.text.length > mostFileCharacters) throw new AppError("too_large", "A file has at most 25 MB.");
  try {
    return touchstoneAnswer(request);
  } catch (error) {
    if (!(error instanceof FileFault)) throw error;
    const { line, message } = error;
    const where = line === null ? message : `Line ${line}: ${message}`;
    throw new AppError("invalid_input", where, { text: [message] }, { members: { line } });
  }
}
