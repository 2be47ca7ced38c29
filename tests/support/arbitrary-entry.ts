/** Entries of a catalogue at random, everything a schema allows: for laws of files that carry them. */
import { catalogueEntrySchema, entryInOrder, type CatalogueEntry } from "@/lib/cables/exchange/catalogue";
import { strangeIn } from "@/lib/cables/exchange/plain-text";
import fc from "@/tests/support/property";

const plain = (most: number, least = 0) =>
  fc
    .oneof(
      fc.string({ maxLength: most, minLength: least, unit: "grapheme" }),
      fc.constantFrom(
        "=1+1",
        "'=x",
        "+44",
        "-3",
        "@home",
        "''",
        '"',
        ",;\t",
        "µ Ω",
        " lead",
        "tail ",
        "a\nb",
        "'",
        "−5",
      ),
    )
    .filter((text) => strangeIn(text, false) === undefined && text.length <= most && text.length >= least);
const trimmed = (most: number, least = 0) =>
  plain(most, least)
    .map((text) => text.trim())
    .filter((text) => text.length >= least && strangeIn(text) === undefined);

const positive = fc.double({ min: 1e-15, max: 1e15, noNaN: true });
const share = fc.double({ min: 0, max: 1, noNaN: true }).map((value) => value + 0);
const notNegative = fc.oneof(fc.constant(0), positive);
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: undefined });
const celsius = fc.double({ min: -200, max: 400, noNaN: true }).map((value) => value + 0);

const conductor = fc.oneof(
  fc.record({ form: fc.constant("constant" as const), r0OhmPerM: notNegative }),
  fc.record({
    form: fc.constantFrom("sqrt" as const, "round" as const, "sheet" as const),
    r0OhmPerM: notNegative,
    skinCornerRadPerS: positive,
  }),
);

// An impedance and a velocity that keep every figure finite.
const model = fc.record({
  conductors: fc.array(conductor, { minLength: 1, maxLength: 2 }),
  lInfHPerM: fc.double({ min: 1e-9, max: 1e-5, noNaN: true }),
  cFPerM: fc.double({ min: 1e-13, max: 1e-9, noNaN: true }),
  lossTangent: maybe(share),
  g0SPerM: maybe(notNegative),
  temperatureCoefficientPerK: maybe(fc.double({ min: -1, max: 1, noNaN: true }).map((value) => value + 0)),
  lossSlopes: maybe(
    fc.array(fc.record({ fromC: fc.constant(20), toC: fc.constant(40), perK: share }), { minLength: 1, maxLength: 1 }),
  ),
});

const construction = fc.oneof(
  fc.record(
    {
      ...{ kind: fc.constant("coax" as const), innerMm: positive, dielectricMm: positive },
      ...{ relativePermittivity: positive, lossTangent: notNegative, outerDiameterMm: positive },
      ...{ conductorResistivityOhmM: positive, strandFactor: positive, braidFactor: positive },
      shieldThicknessMm: positive,
    },
    { requiredKeys: ["kind", "innerMm", "dielectricMm", "relativePermittivity", "lossTangent"] },
  ),
  fc.record(
    {
      ...{ kind: fc.constant("pair" as const), wireMm: positive, spacingMm: positive, effectivePermittivity: positive },
      ...{ lossTangent: notNegative, layMm: positive, screen: fc.record({ innerMm: positive }) },
      outerDiameterMm: positive,
    },
    { requiredKeys: ["kind", "wireMm", "spacingMm", "effectivePermittivity", "lossTangent"] },
  ),
);

const build = fc.record({
  ...{ conductor: plain(120), isStranded: fc.boolean(), dielectricName: plain(80), screenName: plain(120) },
  dielectric: fc.constantFrom("solid" as const, "foam" as const, "airSpaced" as const),
  screen: fc.array(fc.constantFrom("foil" as const, "braid" as const, "drain" as const), { maxLength: 4 }),
  jacket: fc.option(plain(60)),
  pairCount: fc.integer({ min: 1, max: 100 }),
});

const figure = fc.record(
  {
    ...{ quantity: plain(60, 1), valueSi: fc.double({ noNaN: true, noDefaultInfinity: true }).map((v) => v + 0) },
    ...{ asTyped: plain(120), kind: fc.constantFrom("nominal" as const, "maximum" as const, "measured" as const) },
    ...{ source: plain(300, 1), temperatureC: celsius, fromHz: positive, toHz: positive, toleranceSi: notNegative },
  },
  { requiredKeys: ["quantity", "valueSi", "asTyped", "kind", "source"] },
);

const limits = fc.record(
  {
    ...{ maxFrequencyHz: positive, maxVoltageV: positive, minBendMm: positive },
    ...{ minTemperatureC: celsius, maxTemperatureC: celsius },
  },
  { requiredKeys: [] },
);

const inputs = fc.record({
  nominal: fc.record({ z0Ohm: positive, typed: fc.dictionary(trimmed(20), plain(20)) }, { requiredKeys: ["z0Ohm"] }),
});

const standing = fc.record({
  state: fc.constantFrom("draft" as const, "approved" as const, "restricted" as const, "withdrawn" as const),
  revision: fc.integer({ min: 1, max: 99 }),
  preferred: fc.boolean(),
  successor: fc.option(
    fc.record({
      designation: trimmed(40, 1),
      equivalence: fc.constantFrom("dropIn" as const, "needsRedesign" as const),
    }),
  ),
});

/** An entry as its schema has read it. */
export const arbitraryEntry: fc.Arbitrary<CatalogueEntry> = fc
  .record({
    ...{ designation: trimmed(40, 1), aliases: fc.array(trimmed(60, 1), { maxLength: 3 }), name: trimmed(120) },
    ...{ family: fc.constantFrom("coaxial" as const, "twistedPair" as const, "twinaxial" as const), model },
    ...{ construction: fc.option(construction), build: fc.option(build), figures: fc.array(figure, { maxLength: 3 }) },
    ...{ limits, inputs: fc.option(inputs), condition: fc.option(trimmed(300, 1)) },
    standing: maybe(standing),
  })
  .map((entry) => entryInOrder(catalogueEntrySchema.parse(entry)));
