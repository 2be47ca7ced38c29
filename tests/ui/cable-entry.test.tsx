import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, test } from "vitest";
import { Agreement } from "@/components/cables/agreement";
import { fitWords } from "@/components/cables/attenuation";
import { DimensionedSection } from "@/components/cables/dimensioned-section";
import { brokenInto, enlargementFor, sectionParts } from "@/components/cables/section-parts";
import { Sources } from "@/components/cables/sources";
import { StripBack } from "@/components/cables/strip-back";
import { Tolerances } from "@/components/cables/tolerances";
import { UsedIn } from "@/components/cables/used-in";
import type { Build, Cable, Construction, Figure } from "@/lib/cables/schema";
import { modelFromNominal } from "@/lib/line/cable";

afterEach(cleanup);

const coax: Construction = {
  ...{ kind: "coax", innerMm: 2.7, dielectricMm: 7.2, relativePermittivity: 1.384, lossTangent: 1.5e-4 },
  outerDiameterMm: 10.3,
};
const build: Build = {
  ...{ conductor: "2.70 mm solid copper", isStranded: false, dielectric: "foam", dielectricName: "PE" },
  ...{ screen: ["foil", "braid"], screenName: "foil and braid", jacket: "PE", pairCount: 1 },
};
const drawn = { construction: coax, build, outerDiameterMm: 10.3 };

const figure = (quantity: string, valueSi: number, change: Partial<Figure> = {}): Figure => ({
  ...{ quantity, valueSi, asTyped: `${valueSi}`, kind: "nominal", source: "a sheet" },
  ...change,
});

const cable = (change: Partial<Cable>): Cable => ({
  ...{ id: "x", designation: "X", aliases: [], name: "x", family: "coaxial", state: "approved", condition: null },
  ...{ preferred: false, revision: 1, model: modelFromNominal({ z0: 50, velocityFactor: 0.85 }) },
  ...{ construction: coax, build, figures: [], limits: {}, successor: null },
  ...change,
});

describe("The section of an entry", () => {
  test("gives the sizes the entry gives, and says which it does not", () => {
    const sizes = (construction: Construction) =>
      sectionParts({ ...drawn, construction }).map(({ name, sizeMm }) => [name, sizeMm]);
    expect(sizes(coax)).toEqual([
      ["Jacket", 10.3],
      ["Shield", null],
      ["Dielectric", 7.2],
      ["Inner", 2.7],
    ]);
    expect(sizes({ ...coax, shieldThicknessMm: 0.4 })[1]).toEqual(["Shield", 8]);
    render(<DimensionedSection {...drawn} />);
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("foil and braid, thickness not given");
  });

  test("of a tube without a sheath gives the outer diameter to the tube", () => {
    const tube = { ...build, jacket: null, screen: ["tube" as const], screenName: "copper tube" };
    expect(sectionParts({ ...drawn, build: tube })[0]).toMatchObject({ name: "Shield", sizeMm: 10.3 });
  });

  test("of a pair names the distance of its wires, and lays both bare", () => {
    const pair: Construction = {
      ...{ kind: "pair", wireMm: 0.5, spacingMm: 0.9, effectivePermittivity: 2.1, lossTangent: 0, outerDiameterMm: 6 },
    };
    const four = { ...build, screen: [], screenName: "", pairCount: 4 };
    const parts = sectionParts({ construction: pair, build: four, outerDiameterMm: 6, family: "twistedPair" });
    expect(parts.map(({ name, sizeMm }) => [name, sizeMm])).toEqual([
      ["Jacket", 6],
      ["Spacing", 0.9],
      ["Wire", 0.5],
    ]);
    const { container } = render(
      <StripBack designation="P" construction={pair} build={four} outerDiameterMm={6} family="twistedPair" />,
    );
    expect(container.querySelectorAll('rect[fill="var(--conductor)"]')).toHaveLength(2);
    expect(container.textContent).not.toContain("0.90");
  });

  test("of an unknown construction draws nothing that nobody stated", () => {
    const unknown = { construction: null, build: null, outerDiameterMm: null };
    render(<DimensionedSection {...unknown} />);
    expect(screen.getByText(/The construction is not known/)).toBeTruthy();
    expect(render(<StripBack designation="X" {...unknown} />).container.innerHTML).toBe("");
  });

  test.each([
    [10.3, 184, 4],
    [27.8, 184, 1.5],
    [2.2, 184, 20],
    [2000, 184, 0.02],
  ])("%d mm in %d px is drawn %d times as large as it is, at 96 px to the inch", (outerMm, roomPx, ratio) => {
    const enlargement = enlargementFor(outerMm, roomPx);
    expect(enlargement.ratio).toBe(ratio);
    expect(outerMm * enlargement.mmToPx).toBeLessThanOrEqual(roomPx);
    expect(enlargement.mmToPx / ratio).toBeCloseTo(96 / 25.4, 9);
  });

  test("words are broken between words, none is lost, and a long one has its line", () => {
    expect(brokenInto("foil and aluminium braid, thickness not given", 20)).toEqual([
      "foil and aluminium",
      "braid, thickness not",
      "given",
    ]);
    expect(brokenInto("polytetrafluoroethylene tape", 10)).toEqual(["polytetrafluoroethylene", "tape"]);
    expect(brokenInto("", 10)).toEqual([]);
  });
});

describe("Tolerances and limits", () => {
  const rowOf = (name: string) => within(screen.getByRole("row", { name: new RegExp(name) }));
  const loss = { fromHz: 1e8, toHz: 1e8 };

  test("a bound stands beside what it bounds; alone it has its own row; limits follow", () => {
    render(
      <Tolerances
        cable={cable({
          figures: [
            figure("z0Ohm", 50, { toleranceSi: 2 }),
            figure("lossDbPerM", 0.0413, { kind: "typical", ...loss }),
            figure("lossDbPerM", 0.0446, { kind: "maximum", ...loss }),
            figure("r0OhmPerM", 0.009, { kind: "maximum" }),
          ],
          limits: { minBendMm: 105, minTemperatureC: -40, maxTemperatureC: 85 },
        })}
      />,
    );
    expect(rowOf("Impedance").getByText("±2.0")).toBeTruthy();
    expect(screen.getByRole("row", { name: /Loss at 100.MHz/ }).textContent).toContain("4.13dB/100 mat most 4.46");
    expect(screen.getByRole("row", { name: /Loop resistance/ }).textContent).toContain("9.00mΩ/mat most");
    expect(rowOf("Temperature").getByText("−40 to 85")).toBeTruthy();
    expect(screen.getAllByRole("row")).toHaveLength(6);
  });

  test("an entry without figures says so", () => {
    render(<Tolerances cable={cable({ construction: null })} />);
    expect(screen.getByText("The entry states no figures beyond its model.")).toBeTruthy();
  });
});

test("Each figure is shown as its source gives it, under the source", () => {
  render(
    <Sources
      cable={cable({ figures: [figure("z0Ohm", 50, { asTyped: "50 Ω", toleranceSi: 2, temperatureC: 20 })] })}
    />,
  );
  expect(screen.getByText("a sheet")).toBeTruthy();
  expect(screen.getByText("50 Ω")).toBeTruthy();
  expect(screen.getByText("nominal, ±2.0, 20 °C")).toBeTruthy();
});

test("Figures that contradict each other are marked, with by how much", () => {
  const figures = [figure("z0Ohm", 75), figure("velocityFactor", 0.83), figure("cFPerM", 67e-12)];
  render(<Agreement cable={cable({ figures, model: modelFromNominal({ z0: 75, velocityFactor: 0.83 }) })} />);
  expect(screen.getByText("contradiction")).toBeTruthy();
  expect(screen.getByText("+25.0 %")).toBeTruthy();
});

test.each([
  [{ k1: 3.946e-6, k2: 1.7e-11 }, "0.3946 √f + 0.00170 f"],
  [{ k1: 7.089e-6, k2: 0 }, "0.7089 √f"],
  [{ k1: 0, k2: 2e-10 }, "0.0200 f"],
])("A fit of %j reads %s, per 100 m with f in MHz", (parts, words) => {
  expect(fitWords({ ...parts, rows: [], rmsPercent: 0, worstPercent: 0, range: [1, 2] })).toBe(words);
});

describe("Where a cable is used", () => {
  const use = (i: number) => ({
    ...{ runId: `r${i}`, number: `R${i}`, name: `run ${i}`, state: "draft" as const },
    ...{ totalLengthM: 50, cableLengthM: 10, stretches: [{ fromM: 40, toM: 50 }], stubsAtM: [] },
  });

  test("is drawn along the run: the last fifth is the last fifth of the line", () => {
    const { container } = render(<UsedIn total={1} items={[use(1)]} />);
    const bar = container.querySelector("rect");
    expect([bar?.getAttribute("x"), bar?.getAttribute("width")]).toEqual(["76.8", "19.2"]);
    expect(screen.getByText("Used in 1 run")).toBeTruthy();
  });

  test("shows three runs and the others on demand, and says when there are more than it tells", () => {
    render(<UsedIn total={60} items={[1, 2, 3, 4, 5].map(use)} />);
    expect(screen.getAllByRole("link")).toHaveLength(3);
    fireEvent.click(screen.getByRole("button", { name: "Show all" }));
    expect(screen.getAllByRole("link")).toHaveLength(5);
    expect(screen.getByText("The 5 changed last.")).toBeTruthy();
  });
});

test("A source says in its parts who entered and checked a figure, and with what it was measured", () => {
  const provenance = {
    ...{ kind: "measurement" as const, title: "Sample of reel 7", enteredBy: "L. Thornquist", checkedBy: "N. Ferrant" },
    ...{ instrument: "meter 12", calibration: "until May 2027" },
  };
  render(<Sources cable={cable({ figures: [figure("cFPerM", 53.6e-12, { provenance })] })} />);
  expect(
    screen.getByText(
      "entered by L. Thornquist; checked by N. Ferrant; instrument meter 12; calibration until May 2027",
    ),
  ).toBeTruthy();
});
