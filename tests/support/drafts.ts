/** Drafts of runs for tests of the screens' logic. */
import type { RunDraft } from "@/lib/runs/edit";

/** One cable of the demo between 50 Ω and 22 − j35 Ω at 27.2 MHz. */
export function draftOfCircuit(lengthM: number): RunDraft {
  return {
    name: "Mast feeder",
    site: "",
    folder: "",
    circuit: {
      source: { kind: "constant", reOhm: 50, imOhm: 0 },
      elements: [{ kind: "cable", line: { cableId: "c50-f10" }, lengthM }],
      load: { kind: "constant", reOhm: 22, imOhm: -35 },
    },
    temperatureC: 20,
    designHz: 27.2e6,
    availablePowerW: 200,
    bandHz: [26.9e6, 27.5e6],
    targets: [],
    sourceName: "Source",
    loadName: "Load",
  };
}
