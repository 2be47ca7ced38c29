/** What a revision does to a run, in words and figures. */
import type { Effect, RunEffect } from "@/lib/runs/effects/schema";
import { digits, ratio } from "@/lib/format/quantity";

const names: Partial<Record<Effect["quantity"], { name: string; unit: string }>> = {
  loss: { name: "Loss", unit: "dB" },
  returnLoss: { name: "Return loss", unit: "dB" },
  vswr: { name: "VSWR", unit: "" },
  voltage: { name: "Highest voltage", unit: "V" },
};

export function effectName({ quantity, plane }: Effect): string {
  const at = plane && "at" in plane && plane.at === "load" ? " at the load" : "";
  return `${names[quantity]?.name ?? quantity}${at}`;
}

export const effectUnit = ({ quantity }: Effect) => names[quantity]?.unit ?? "";

export function effectDigits({ quantity }: Effect, value: number | null): string {
  if (quantity === "vswr") return ratio(value).digits;
  return digits(value, quantity === "voltage" ? 1 : 2);
}

/** The effect a run is told by: one that changes state, else the loss where it changes, else the largest change. */
export function mainEffect({ effects }: RunEffect): Effect | undefined {
  const flips = effects.find(({ now, then }) => now.isMet !== then.isMet);
  const loss = effects.find(({ quantity, why }) => quantity === "loss" && why === null);
  const size = ({ changePercent }: Effect) => Math.abs(changePercent ?? 0);
  return flips ?? loss ?? [...effects].sort((a, b) => size(b) - size(a))[0];
}

/** What the revision does to the targets of all runs, in one sentence. */
export function stateSentence(items: readonly RunEffect[]): { state: "pass" | "warn" | "fail"; text: string } {
  const judged = items.flatMap(({ effects }) => effects.map(({ now, then }) => [now.isMet, then.isMet] as const));
  const broken = judged.filter(([now, then]) => now === true && then === false).length;
  const met = judged.filter(([now, then]) => now === false && then === true).length;
  const unknown = items.filter(({ why, effects }) => why !== null || effects.some((effect) => effect.why)).length;
  const rest = unknown > 0 ? ` ${unknown === 1 ? "One run" : `${unknown} runs`} cannot be worked out in full.` : "";
  const targets = (count: number) => (count === 1 ? "One target" : `${count} targets`);
  if (broken > 0)
    return {
      state: "fail",
      text: `${targets(broken)} that ${broken === 1 ? "is" : "are"} met would be missed.${rest}`,
    };
  if (met > 0)
    return { state: "pass", text: `${targets(met)} that ${met === 1 ? "is" : "are"} missed would be met.${rest}` };
  return { state: unknown > 0 ? "warn" : "pass", text: `No target changes state.${rest}` };
}
