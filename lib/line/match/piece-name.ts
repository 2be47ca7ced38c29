/** What the pieces of a match are called in the run they are put into. */
export const matchPieceNames = [
  "Stub",
  "Stub to load",
  "Stub to run",
  "Section",
  "Quarter-wave section",
  "Section to load",
  "Section to run",
  "Series coil",
  "Series capacitor",
  "Shunt coil",
  "Shunt capacitor",
] as const;
export type MatchPieceName = (typeof matchPieceNames)[number];
