/** Sections of a transformer, from the target side. */
export const sectionNames = [
  "Section 1",
  "Section 2",
  "Section 3",
  "Section 4",
  "Section 5",
  "Section 6",
  "Section 7",
  "Section 8",
  "Section 9",
  "Section 10",
] as const;

/** What the pieces of a match are called in the run they are put into. */
export const matchPieceNames = [
  "Stub",
  "Stub to load",
  "Stub to run",
  "Section",
  "Quarter-wave section",
  "Section to load",
  "Section to run",
  "First stub",
  "Second stub",
  "Stub to stub",
  ...sectionNames,
  "Notch stub",
  "Second stub at the tee",
  "Pad",
  "Series resistor",
  "Shunt resistor",
  "Series coil",
  "Series capacitor",
  "Shunt coil",
  "Shunt capacitor",
] as const;
export type MatchPieceName = (typeof matchPieceNames)[number];
