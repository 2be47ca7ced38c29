/** Reads the time-domain check values and turns their inputs into the engine's shapes. */
import type { Circuit, Element, Termination } from "@/lib/line/element";
import type { Drive } from "@/lib/line/time/drive";
import { valueAt } from "@/lib/line/time/signal";
import { timeResponse } from "@/lib/line/time/time-response";
import {
  circuitOf,
  modelOf,
  type CheckCable,
  type CheckCircuit,
  type CheckTermination,
} from "@/tests/support/line-checks";

interface StepTermination {
  type: "r" | "open" | "short" | "parallel_rc" | "series_rc" | "series_rl" | "parallel_rl";
  r_ohm?: number;
  c_f?: number;
  l_h?: number;
}

export interface StepInputs {
  cable?: CheckCable;
  length_m?: number;
  elements?: CheckCircuit["elements"];
  source: { re_ohm: number };
  load: StepTermination;
  edge_shape: "raised_cosine" | "sine_squared";
  edge_duration_s: number;
  amplitude_v: number;
  pulse_width_s?: number;
  time_s: number[];
}

function loadOf({ type, r_ohm, c_f, l_h }: StepTermination): Termination {
  if (type === "open" || type === "short") return { kind: type };
  if (type === "r") return { kind: "constant", reOhm: r_ohm!, imOhm: 0 };
  const topology = type.startsWith("series") ? "series" : "parallel";
  const part = type.endsWith("rc") ? { cF: c_f! } : { lH: l_h! };
  return { kind: "network", topology, rOhm: r_ohm!, ...part };
}

export function stepCircuit(inputs: StepInputs): Circuit {
  const source = { re_ohm: inputs.source.re_ohm } satisfies CheckTermination;
  const single: Element[] = inputs.cable
    ? [
        {
          kind: "cable",
          line: { model: modelOf(inputs.cable) },
          lengthM: inputs.length_m!,
          temperatureC: inputs.cable.temperature_c,
        },
      ]
    : [];
  const chain = circuitOf({ source, elements: inputs.elements ?? [], load: { type: "open" } });
  return { ...chain, elements: [...chain.elements, ...single], load: loadOf(inputs.load) };
}

export function stepDrive(inputs: StepInputs): Drive {
  const edge = inputs.edge_shape === "raised_cosine" ? "raisedCosine" : "sineSquared";
  const shared = { amplitudeV: inputs.amplitude_v, riseS: inputs.edge_duration_s, edge } as const;
  if (inputs.pulse_width_s === undefined) return { kind: "step", ...shared };
  return { kind: "pulse", ...shared, widthS: inputs.pulse_width_s };
}

/** Source and load voltage at the times asked, from a window that ends with the last of them. */
export function stepVoltages(inputs: StepInputs): { source: number[]; load: number[] } {
  const windowS = inputs.time_s.reduce((a, b) => Math.max(a, b));
  const { planes } = timeResponse(stepCircuit(inputs), stepDrive(inputs), { windowS, points: 16_385 });
  const [source, load] = planes.map((signal) => inputs.time_s.map((t) => valueAt(signal, t)));
  return { source: source!, load: load! };
}
