/** What stands in the fields of the entry editor: texts, and choices. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Provenance } from "@/lib/cables/provenance";
import type { Build, Family } from "@/lib/cables/schema";
import { type FigureName, figureNames } from "@/lib/cables/editor/fields";
import type { LossUnit } from "@/lib/cables/pasting/units";
import type { LossTableInput } from "@/lib/cables/ways/loss-way";
import type { Ruling } from "@/lib/cables/ways/ruling";

export interface RowTexts {
  /** MHz unless another unit is typed */
  frequency: string;
  /** in the unit of the table */
  loss: string;
  isLeftOut: boolean;
  note: string;
}

export const sourceWays = ["construction", "nominal", "lossTable", "readings"] as const;
export type SourceWay = (typeof sourceWays)[number];

export const sourceParts = ["title", "issue", "page", "checkedBy", "instrument", "calibration"] as const;
export type SourceTexts = Record<(typeof sourceParts)[number], string> & { kind: Provenance["kind"] | "" };

export interface EntryTexts {
  designation: string;
  /** separated by commas */
  aliases: string;
  name: string;
  family: Family;
  kind: "none" | "coax" | "pair";
  metal: "copper" | "silver" | "aluminium";
  hasBuild: boolean;
  build: Omit<Build, "pairCount" | "jacket"> & { pairCount: string; jacket: string };
  figures: Record<FigureName, string>;
  tableKind: LossTableInput["kind"];
  lossUnit: LossUnit;
  rows: RowTexts[];
  ruling: Ruling;
  form: "" | "round" | "sqrt";
  instrument: string;
  /** what was worked out of a sweep when its file was read */
  sweep: EntryInputs["sweep"] | null;
  sources: Record<SourceWay, SourceTexts>;
}

export const emptyRow: RowTexts = { frequency: "", loss: "", isLeftOut: false, note: "" };

export const emptySource: SourceTexts = {
  ...{ kind: "", title: "", issue: "", page: "", checkedBy: "", instrument: "", calibration: "" },
};

export const noFigures = Object.fromEntries(figureNames.map((name) => [name, ""])) as Record<FigureName, string>;

/** An entry before anything has been typed. */
export const emptyTexts: EntryTexts = {
  designation: "",
  aliases: "",
  name: "",
  family: "coaxial",
  kind: "coax",
  metal: "copper",
  hasBuild: true,
  build: {
    ...{ conductor: "", isStranded: false, dielectric: "foam", dielectricName: "PE", screen: ["foil", "braid"] },
    ...{ screenName: "foil and braid", jacket: "PE", pairCount: "1" },
  },
  figures: { ...noFigures, tableTemperature: "20" },
  tableKind: "nominal",
  lossUnit: "dB/100 m",
  rows: [],
  ruling: { impedance: "nominal", loss: "lossTable", resistance: "nominal" },
  form: "",
  instrument: "",
  sweep: null,
  sources: { construction: emptySource, nominal: emptySource, lossTable: emptySource, readings: emptySource },
};
