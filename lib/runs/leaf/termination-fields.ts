/** Fields of a termination: what stands at an end of the line, of a stub, or across it. */
import { choice, impedanceField, optionalQuantity, type LeafField } from "@/lib/runs/leaf/field";
import type { Termination } from "@/lib/line/element";

type Network = Extract<Termination, { kind: "network" }>;

const kinds: [string, string][] = [
  ["constant", "Impedance"],
  ["series", "R, L, C in series"],
  ["parallel", "R, L, C in parallel"],
  ["open", "Open"],
  ["short", "Shorted"],
];

const isNetwork = (edited: Termination): edited is Network => edited.kind === "network";

/** The choice in the list of kinds that a termination stands for; a measured one is shown, not typed. */
function chosen(edited: Termination): string {
  return isNetwork(edited) ? edited.topology : edited.kind;
}

function ofKind(value: string, before: Termination): Termination {
  switch (value) {
    case "series":
    case "parallel":
      if (isNetwork(before)) return { ...before, topology: value };
      return { kind: "network", topology: value, rOhm: before.kind === "constant" ? before.reOhm : 50 };
    case "open":
    case "short":
      return { kind: value };
    default:
      return { kind: "constant", reOhm: isNetwork(before) ? (before.rOhm ?? 50) : 50, imOhm: 0 };
  }
}

const network = (key: "rOhm" | "lH" | "cF", label: string, kind: "resistance" | "inductance" | "capacitance") =>
  optionalQuantity<Network>({
    key,
    label,
    kind,
    bounds: { isNotNegative: true },
    isShown: isNetwork,
  }) as unknown as LeafField<Termination>;

/** @param canBeOpen - a source may be a short (0 Ω) but not open */
export function terminationFields(canBeOpen = true): LeafField<Termination>[] {
  return [
    choice<Termination, "kind">("kind", "Kind", canBeOpen ? kinds : kinds.filter(([value]) => value !== "open"), {
      text: chosen,
      write: (edited, value) => ofKind(value, edited),
    }),
    impedanceField<Termination>(
      "Impedance",
      (edited) => (edited.kind === "constant" ? { re: edited.reOhm, im: edited.imOhm } : { re: 50, im: 0 }),
      (_, { re, im }) => ({ kind: "constant", reOhm: re, imOhm: im }),
      (edited) => edited.kind === "constant",
    ),
    network("rOhm", "Resistance", "resistance"),
    network("lH", "Inductance", "inductance"),
    network("cF", "Capacitance", "capacitance"),
  ];
}

/** A termination in words, for the ends of the strip. */
export function terminationWords(termination: Termination): string {
  switch (termination.kind) {
    case "open":
      return "open";
    case "short":
      return "shorted";
    case "network":
      return `${["R", "L", "C"].filter((_, i) => [termination.rOhm, termination.lH, termination.cF][i] !== undefined).join(" ")} in ${termination.topology}`;
    case "sampled":
      return "measured";
    case "constant":
      return "";
  }
}
