import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { catalogueAddress, catalogueSorts, readCatalogueAddress, type CatalogueAsked } from "@/lib/cables/address";
import { entryAddress, readEntryAddress } from "@/lib/cables/entry-address";
import { cableQuerySchema } from "@/lib/cables/query";
import { cableRequest, nextRequest } from "@/lib/cables/request";

const searchOf = (address: string) => new URLSearchParams(address.split("?")[1] ?? "");
/** As a page is handed it: repeated words as lists. */
const recordOf = (address: string) => {
  const record: Record<string, string | string[]> = {};
  for (const [name, value] of searchOf(address)) {
    const before = record[name];
    record[name] = before === undefined ? value : [before, value].flat();
  }
  return record;
};
const usual = readCatalogueAddress({});

const range = fc
  .tuple(
    fc.option(fc.double({ min: 0, max: 1e4, noNaN: true })),
    fc.option(fc.double({ min: 0, max: 1e4, noNaN: true })),
  )
  .map(([a, b]) => {
    const ends = [a, b].filter((end) => end !== null).sort((x, y) => x - y);
    if (ends.length === 2) return { from: ends[0]!, to: ends[1]! };
    return a !== null ? { from: a } : b !== null ? { to: b } : undefined;
  });
const asked: fc.Arbitrary<CatalogueAsked> = fc
  .record({
    q: fc.string({ maxLength: 40 }),
    isExact: fc.boolean(),
    lossAtHz: fc.double({ min: 1, max: 9e11, noNaN: true }),
    ranges: fc.record({ z0Ohm: range, velocityFactor: range, lossDbPer100m: range, outerDiameterMm: range }),
    families: fc.uniqueArray(fc.constantFrom("coaxial" as const, "twistedPair" as const, "twinaxial" as const)),
    states: fc.uniqueArray(fc.constantFrom("approved" as const, "draft" as const, "withdrawn" as const)),
    sort: fc.constantFrom(...catalogueSorts),
    isReversed: fc.boolean(),
    held: fc.uniqueArray(fc.string({ minLength: 1, maxLength: 12 }), { maxLength: 4 }),
    isCompared: fc.boolean(),
  })
  .map((one) => ({
    ...one,
    ranges: Object.fromEntries(Object.entries(one.ranges).filter(([, given]) => given !== undefined)),
    // By fit there is no order without a search, and no comparison of nothing.
    sort: one.sort === "relevance" && one.q.trim() === "" ? "designation" : one.sort,
    isCompared: one.isCompared && one.held.length > 0,
  }));

describe("The address of a search", () => {
  test("gives back what was asked, held cables and open comparison included, however it is handed on", () => {
    fc.assert(
      fc.property(asked, (one) => {
        const address = catalogueAddress(one);
        expect(readCatalogueAddress(searchOf(address))).toEqual(one);
        expect(readCatalogueAddress(recordOf(address))).toEqual(one);
      }),
    );
  });

  test("is short where everything is as usual", () => {
    expect(catalogueAddress(usual)).toBe("/cables");
    expect(catalogueAddress({ ...usual, q: "foam", sort: "relevance" })).toBe("/cables?q=foam");
  });

  test.each<[string, Partial<CatalogueAsked>]>([
    ["at=-5&sort=colour&family=rope&state=lost", {}],
    ["z0=55..45&vf=a..b&loss=..&od=5", {}],
    ["z0=..55&vf=0.8..", { ranges: { z0Ohm: { to: 55 }, velocityFactor: { from: 0.8 } } }],
    ["held=a&held=a&held=&held=b&held=c&held=d&held=e&compare=yes", { held: ["a", "b", "c", "d"] }],
    ["compare=open", {}],
    ["sort=relevance", {}],
    ["family=__proto__&state=constructor", {}],
    ["at=1e999&z0=1e999..2e999", {}],
  ])("leaves out of ?%s what cannot be read", (text, read) => {
    expect(readCatalogueAddress(new URLSearchParams(text))).toEqual({ ...usual, ...read });
  });
});

describe("The request of a search", () => {
  test("is one the API reads, whatever was asked", () => {
    fc.assert(
      fc.property(asked, (one) => {
        const request = recordOf(cableRequest(one));
        expect(cableQuerySchema.safeParse(request).error?.issues ?? []).toEqual([]);
      }),
    );
  });

  test("asks for the counts of the filters with the first page only, and leaves the usual states to the API", () => {
    expect(recordOf(cableRequest(usual))).toHaveProperty("facets", "true");
    expect(recordOf(cableRequest(usual))).not.toHaveProperty("state");
    const next = recordOf(nextRequest(cableRequest(usual), "a+b"));
    expect(next).toMatchObject({ cursor: "a+b", limit: "100" });
    expect(next).not.toHaveProperty("facets");
  });

  test("does not change with what is held up", () => {
    expect(cableRequest({ ...usual, held: ["a"], isCompared: true })).toBe(cableRequest(usual));
  });
});

describe("The address of an entry", () => {
  test("gives back frequency, temperature and what is held, whatever the id is called", () => {
    const looked = { lossAtHz: 160e6, temperatureC: -12.5, held: ["c50-f7", "c50-f28"] };
    const address = entryAddress("a/b?c", looked);
    expect(address.split("?")[0]).toBe("/cables/a%2Fb%3Fc");
    expect(readEntryAddress(searchOf(address))).toEqual(looked);
  });

  test("is the entry's alone where everything is as usual, and takes the usual for what cannot be read", () => {
    expect(entryAddress("c50-f10", {})).toBe("/cables/c50-f10");
    expect(readEntryAddress({ at: "x", t: "1e9" })).toEqual({ lossAtHz: 100e6, temperatureC: 20, held: [] });
  });
});
