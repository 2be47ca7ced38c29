/** The kinds of piece that can be added to a line, as people call them. */
import type { Element } from "@/lib/runs/circuit-schema";

export const elementKinds: { kind: Element["kind"]; label: string }[] = [
  { kind: "cable", label: "Cable" },
  { kind: "joint", label: "Joint" },
  { kind: "stub", label: "Stub" },
  { kind: "part", label: "Coil, capacitor or resistor" },
  { kind: "pad", label: "Pad" },
  { kind: "shunt", label: "Something across the line" },
  { kind: "transformer", label: "Transformer" },
];
