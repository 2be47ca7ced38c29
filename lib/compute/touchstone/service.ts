import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { Refusal } from "@/lib/compute/apart/refusal";
import { mostFileCharacters, type TouchstoneRequest } from "@/lib/compute/touchstone/schema";
import { AppError } from "@/lib/http/errors";

/** @throws AppError `too_large`, or `invalid_input` that carries the line as `line` */
export async function computeTouchstone(actor: Actor, request: TouchstoneRequest) {
  requirePermission(actor, "compute.use");
  if (request.text.length > mostFileCharacters) throw new AppError("too_large", "A file has at most 25 MB.");
  try {
    return await computeApart("touchstone", request);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    const { message, members } = error;
    const where = members.line === null ? message : `Line ${members.line as number}: ${message}`;
    throw new AppError("invalid_input", where, { text: [message] }, { members });
  }
}
