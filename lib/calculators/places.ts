/** The calculators there are: where each stands, what it is called, and what it answers. Pure. */

export const calculatorPlaces = [
  {
    path: "/calculate/per-length",
    label: "Per length",
    title: "Per-length figures",
    answers:
      "Impedance, velocity, delay, capacitance, inductance: any two give the rest, and a third is held against them.",
  },
  {
    path: "/calculate/attenuation",
    label: "Attenuation",
    title: "Attenuation of a length",
    answers:
      "What a length loses at a frequency and a temperature, its delay and its dc resistance, and the curve over frequency.",
  },
  {
    path: "/calculate/mismatch",
    label: "Mismatch",
    title: "Mismatch and power",
    answers:
      "VSWR, return loss, reflection and load from any one of them; power, volts and amperes; what the near end reads.",
  },
  {
    path: "/calculate/length",
    label: "Length",
    title: "Electrical and cut length",
    answers: "Degrees, wavelengths or nanoseconds of a cable, the millimetres to cut, and which way trimming goes.",
  },
  {
    path: "/calculate/stub",
    label: "Stub",
    title: "Stub and section",
    answers:
      "What an open or shorted stub is, how long one for a wanted reactance, and a quarter-wave section from your cables.",
  },
  {
    path: "/calculate/pad",
    label: "Pad",
    title: "Resistive pad",
    answers: "T and pi for a loss between two resistances, in values you can buy, with the watts in each resistor.",
  },
] as const;

export type CalculatorPath = (typeof calculatorPlaces)[number]["path"];
