/** What a calculator opens with: its address read, and the cable it names looked up. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { readAddress, type Opened, type Parameters } from "@/lib/calculators/address";
import { valuesOf, type Inputs, type Values } from "@/lib/calculators/input";
import { lineOf, type CableLine } from "@/lib/cables/line";
import { getCable, listCables } from "@/lib/cables/service";
import { typedCable } from "@/lib/cables/line";
import * as reader from "@/lib/format/read-quantity";
import { AppError } from "@/lib/http/errors";

export interface OpenedCalculator<I extends Inputs> extends Opened {
  /** of the texts, read already */
  values: Values<I>;
  /** the cable of the address, or the usual one */
  line: CableLine | null;
}

/**
 * A calculator as an address asks for it. A cable that the actor may not read, or that does not exist, is said and
 * replaced by the usual one: a preferred cable, else the first, else one that is typed.
 * @throws AppError `forbidden` where the actor may not compute
 */
export function openCalculator<I extends Inputs>(actor: Actor, inputs: I, parameters: Parameters): OpenedCalculator<I> {
  requirePermission(actor, "compute.use");
  const opened = "cable" in inputs ? openLine(actor, inputs, parameters) : withoutLine(inputs, parameters);
  return { ...opened, values: valuesOf(inputs, opened.texts, reader) };
}

type OpenedLine = Opened & { line: CableLine | null };

function withoutLine(inputs: Inputs, parameters: Parameters): OpenedLine {
  return { ...readAddress(inputs, parameters, reader), line: null };
}

function openLine(actor: Actor, inputs: Inputs, parameters: Parameters): OpenedLine {
  const opened = readAddress(inputs, parameters, reader);
  const named = [parameters.cable].flat()[0];
  // What readAddress could not take has been noted by it.
  const asked = named === opened.texts.cable ? named : undefined;
  if (asked === typedCable) return { ...opened, line: null };
  const found = asked === undefined ? null : readableLine(actor, asked);
  const line = found ?? usualLine(actor);
  const notes =
    asked === undefined || found
      ? opened.notes
      : [...opened.notes, `There is no cable “${asked}” for you. ${line?.designation ?? "A typed cable"} stands here.`];
  return { texts: { ...opened.texts, cable: line?.cableId ?? typedCable }, notes, line };
}

function readableLine(actor: Actor, cableId: string): CableLine | null {
  try {
    return lineOf(getCable(actor, cableId));
  } catch (error) {
    if (error instanceof AppError && (error.code === "not_found" || error.code === "forbidden")) return null;
    throw error;
  }
}

function usualLine(actor: Actor): CableLine | null {
  const first = (preferred?: true) => listCables(actor, { limit: 1, sort: "designation", preferred }).items[0];
  const item = first(true) ?? first();
  return item ? readableLine(actor, item.id) : null;
}
