import { expect, test } from "vitest";
import { matchExpression, readSearch, vocabulary } from "@/lib/cables/read-search";
import { cableWords } from "@/lib/cables/words";
import type { Build } from "@/lib/cables/schema";

const build: Build = {
  conductor: "solid copper 2.70 mm",
  isStranded: false,
  dielectric: "foam",
  dielectricName: "foam PE",
  screen: ["foil", "braid"],
  screenName: "foil and braid",
  jacket: "PE",
  pairCount: 1,
};
const lowLoss = cableWords({
  designation: "C50-F10",
  aliases: ["roof feeder"],
  name: "50 Ω 10 mm low-loss",
  family: "coaxial",
  build,
});
const bus = cableWords({
  designation: "P120-S1",
  aliases: [],
  name: "120 Ω bus pair 0.22 mm²",
  family: "twistedPair",
  build: { ...build, isStranded: true, jacket: "PUR", conductor: "7-strand copper" },
});
const known = vocabulary(`${lowLoss} ${bus} outdoor semirigid corrugated`.split(" "));

test("cableWords(cable) answers to compounds joined and apart, to synonyms and to the construction", () => {
  const words = new Set(lowLoss.split(" "));
  for (const word of [
    "c50f10",
    "c50",
    "f10",
    "lowloss",
    "low",
    "loss",
    "10mm",
    "50ohm",
    "foam",
    "foil",
    "braid",
    "screened",
    "coaxial",
    "roof",
  ])
    expect(words.has(word), word).toBe(true);
  expect(bus.split(" ")).toContain("stranded");
});

test.each([
  ["lowloss 10 milimeter", "lowloss, 10 mm across"],
  ["screned outdoor", "screened, outdoor"],
  ["shielded pair", "screened, pair"],
  ["75 ohm 7 mm", "75 Ω, 7 mm across"],
  ["75Ω 7mm", "75 Ω, 7 mm across"],
  ["coxial 50", "coaxial, 50 Ω"],
  ["feoder 0.85", "feeder, velocity factor 0.85"],
  ["foam 85 %", "foam, velocity factor 0.85"],
  ["78,5 pF/m", "78.5 pF/m"],
  ["cable with braid", "braid"],
])("readSearch(%j) is read as %j", (typed, text) => {
  expect(readSearch(typed, known).text).toBe(text);
});

test("readSearch(text) says which words it mended and leaves known words alone", () => {
  expect(readSearch("screned foil", known).corrected).toEqual([{ typed: "screned", read: "screened" }]);
  expect(readSearch("foil braid", known).corrected).toEqual([]);
});

test("the word being typed is taken as a beginning, a finished one is not", () => {
  expect(readSearch("scre", known).terms).toMatchObject([{ word: "scre", isPrefix: true }]);
  expect(readSearch("c50", known).terms).toMatchObject([{ word: "c50", isPrefix: true }]);
  expect(readSearch("foil ", known).terms).toMatchObject([{ word: "foil", isPrefix: false }]);
});

test("an exact search mends nothing", () => {
  expect(readSearch("screned", known, true).terms).toMatchObject([{ word: "screned", isKnown: false }]);
});

test("a word that means nothing to the team stays unknown instead of turning into another", () => {
  for (const word of ["zzzzqq", "xylophone", "40m", "ab"])
    expect(readSearch(`${word} `, known).terms).toMatchObject([{ isKnown: false }]);
});

test("matchExpression(team, terms) holds nothing but quoted letters and digits, whatever was typed", () => {
  const hostile = readSearch('foil" OR team : "other* NEAR(a b) ^x -y', known);
  const expression = matchExpression("t1", hostile.terms) ?? "";
  expect(
    expression
      .replace(/(team|words) : "[\p{L}\p{N}]+"\*?/gu, "")
      .replace(/ AND /g, "")
      .trim(),
  ).toBe("");
  expect(matchExpression("t1", readSearch("50 ohm", known).terms)).toBeNull();
});
