import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { lineScale } from "@/components/line/line-scale";
import { RangeBar } from "@/components/plot/range-bar";
import { fittingEdge, SmithChart } from "@/components/plot/smith-chart";
import { StandingWavePlot } from "@/components/plot/standing-wave-plot";

afterEach(cleanup);

const wave = (ripples: number) => {
  const distancesM = Array.from({ length: 2001 }, (_, i) => i / 50);
  const voltageV = distancesM.map((m) => 30 + 6 * Math.cos((2 * Math.PI * ripples * m) / 40 + 1));
  return { distancesM, voltageV, currentTimesReferenceV: voltageV.map((v) => 60 - v) };
};

function plotWave(ripples: number) {
  return render(
    <StandingWavePlot
      {...wave(ripples)}
      scale={lineScale([{ lengthM: 40, symbolPx: 0 }], 68, 1302)}
      width={1384}
      currentName="Current × 50 Ω"
      greatestVoltage="36.0 V"
      greatestCurrent="0.72 A"
      format={String}
      readout={(index) => [`sample ${index}`]}
    />,
  );
}

test("voltage and current are named at the end of the line with their greatest values", () => {
  const { container } = plotWave(20);
  expect(container.textContent).toContain("Voltage36.0 V max");
  expect(container.textContent).toContain("Current × 50 Ω0.72 A max");
});

test("above 80 ripples the wave says how many there are and that only the curves that hold them are drawn", () => {
  plotWave(80);
  expect(screen.queryByText(/ripples/)).toBeNull();
  cleanup();
  plotWave(140);
  expect(screen.getByText("140 ripples; drawn as the curves that hold them")).toBeTruthy();
});

test("a stretch where nothing could be computed is left out, and no coordinate is NaN", () => {
  const { distancesM, voltageV, currentTimesReferenceV } = wave(5);
  const { container } = render(
    <StandingWavePlot
      distancesM={distancesM}
      voltageV={voltageV.map((v, i) => (i > 500 && i < 900 ? null : v))}
      currentTimesReferenceV={currentTimesReferenceV.map(() => null)}
      scale={lineScale([{ lengthM: 40, symbolPx: 0 }], 68, 1302)}
      width={1384}
      currentName="Current"
      greatestVoltage="36.0 V"
      greatestCurrent="–"
      format={String}
      readout={() => []}
    />,
  );
  expect(container.innerHTML).not.toContain("NaN");
  expect(container.querySelector('path[stroke="var(--series-1)"]')?.getAttribute("d")?.match(/M/g)).toHaveLength(2);
});

test("the centre of the Smith chart holds all that is drawn, and never more than the whole chart", () => {
  expect(fittingEdge([{ re: 0.2, im: 0.2 }, null])).toBeGreaterThan(Math.hypot(0.2, 0.2));
  expect(fittingEdge([{ re: 0.99, im: 0 }])).toBe(1);
  expect(fittingEdge([])).toBe(0.1);
});

test("reactance above zero is drawn above the middle, and the target disc to the scale of the frame", () => {
  const { container } = render(
    <SmithChart
      size={204}
      edge={0.5}
      target={{ magnitude: 0.25, label: "VSWR 1.67" }}
      traces={[
        {
          id: "a",
          label: "A",
          look: 1,
          points: [
            { re: 0, im: 0.1 },
            { re: 0.25, im: 0 },
          ],
        },
      ]}
    />,
  );
  // The frame's radius is 100 px for |Γ| 0.5.
  expect(container.querySelector('circle[fill="var(--pass-wash)"]')?.getAttribute("r")).toBe("50");
  expect(container.querySelector('path[stroke="var(--series-1)"]')?.getAttribute("d")).toBe("M0.0 -20.0L50.0 0.0");
  expect(container.textContent).toContain("edge is |Γ| 0.50");
});

test("the whole chart can be shown, and its edge is then 1", () => {
  const { container } = render(<SmithChart traces={[]} edge={0.36} />);
  fireEvent.click(screen.getByRole("button", { name: "The whole chart" }));
  expect(container.textContent).toContain("edge is |Γ| 1.00");
});

test("a range bar places decades at equal distances and keeps what is beyond its axis at the edge", () => {
  const { container } = render(<RangeBar range={[1, 10]} at={1000} domain={[0.1, 100]} width={90} />);
  expect(container.querySelector('path[stroke="var(--ghost)"]')?.getAttribute("d")).toBe("M30 17H60");
  expect(container.querySelector("circle")?.getAttribute("cx")).toBe("90");
});
