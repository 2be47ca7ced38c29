import fc from "fast-check";
import { expect, test } from "vitest";
import { cableShape } from "@/components/line/cable-shape";
import type { Build } from "@/lib/cables/schema";

const build = (changes: Partial<Build>): Build => ({
  conductor: "copper",
  isStranded: false,
  dielectric: "foam",
  dielectricName: "foam PE",
  screen: ["foil", "braid"],
  screenName: "foil and braid",
  jacket: "PE",
  pairCount: 1,
  ...changes,
});

const diameter = fc.double({ min: 0.2, max: 30, noNaN: true });

test("the layers of a coaxial cable lie inside one another, whatever is given and left out", () => {
  fc.assert(
    fc.property(diameter, diameter, fc.option(diameter), fc.boolean(), (a, b, outer, hasJacket) => {
      const [innerMm, dielectricMm] = [Math.min(a, b), Math.max(a, b) + 0.1];
      const shape = cableShape({
        construction: { kind: "coax", innerMm, dielectricMm, relativePermittivity: 1.5, lossTangent: 0 },
        build: build({ jacket: hasJacket ? "PE" : null }),
        outerDiameterMm: outer,
      });
      if (shape?.kind !== "coax") throw new Error("a coax is drawn as a coax");
      expect(shape.innerMm).toBeLessThan(shape.dielectricMm);
      expect(shape.screen?.outerMm).toBeGreaterThanOrEqual(shape.dielectricMm);
      expect(shape.outerMm).toBeGreaterThanOrEqual((shape.screen?.outerMm ?? 0) - 1e-9);
    }),
  );
});

test("an outer diameter that is given is the one that is drawn", () => {
  const construction = {
    kind: "coax",
    innerMm: 2.7,
    dielectricMm: 7.2,
    relativePermittivity: 1.38,
    lossTangent: 0,
  } as const;
  expect(cableShape({ construction, build: build({}), outerDiameterMm: 10.3 })?.outerMm).toBe(10.3);
});

test("pairs fit inside their cable even when the outer diameter given is too small for them", () => {
  const construction = { kind: "pair", wireMm: 0.5, spacingMm: 1, effectivePermittivity: 2, lossTangent: 0 } as const;
  const shape = cableShape({ construction, build: build({ pairCount: 4, screen: [] }), outerDiameterMm: 1 });
  expect(shape?.outerMm).toBeGreaterThan(4);
  expect(shape?.screen).toBeNull();
});

test("a twinaxial pair is drawn side by side, a twisted pair turned", () => {
  const construction = { kind: "pair", wireMm: 0.5, spacingMm: 1, effectivePermittivity: 2, lossTangent: 0 } as const;
  const cable = { construction, build: build({}), outerDiameterMm: 6 };
  expect(cableShape({ ...cable, family: "twinaxial" })).toMatchObject({ isTwisted: false });
  expect(cableShape({ ...cable, family: "twistedPair" })).toMatchObject({ isTwisted: true });
});

test("without a construction there is no shape to draw", () => {
  expect(cableShape({ construction: null, build: null, outerDiameterMm: 7 })).toBeNull();
});
