import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { ChartFrame } from "@/components/plot/chart-frame";
import { CursorProvider } from "@/components/plot/cursor";
import { SweepPlot, type SweepPlotProps } from "@/components/plot/sweep-plot";

afterEach(cleanup);

const plain: SweepPlotProps = {
  xs: [150e6, 156e6, 162e6, 168e6],
  series: [
    { id: "radio", label: "at the radio", look: 1, values: [13, 15.7, 18, 17] },
    { id: "whip", label: "at the whip", look: 2, values: [8, 11, null, 12] },
  ],
  xDomain: [150e6, 168e6],
  yDomain: [6, 26],
  xUnit: "MHz",
  formatX: (hz) => String(hz / 1e6),
  formatY: (db) => db.toFixed(1),
};

const curves = (container: HTMLElement) => [...container.querySelectorAll("path.recharts-line-curve")];

test("each series has its colour, its dash and its name at the end of its line", () => {
  const { container } = render(<SweepPlot {...plain} />);
  const [radio, whip] = curves(container);
  expect([radio?.getAttribute("stroke"), whip?.getAttribute("stroke")]).toEqual(["var(--series-1)", "var(--series-2)"]);
  expect(whip?.getAttribute("stroke-dasharray")).toBe("7 3");
  expect(screen.getByText("at the radio")).toBeTruthy();
  expect(screen.getByText("at the whip")).toBeTruthy();
});

test("a value that could not be computed leaves a gap in the line", () => {
  const { container } = render(<SweepPlot {...plain} />);
  const [radio, whip] = curves(container).map((path) => path.getAttribute("d") ?? "");
  expect(radio?.match(/M/g)).toHaveLength(1);
  expect(whip?.match(/M/g)).toHaveLength(2);
});

test("a curve that leaves the frame is marked off scale, one that stays inside is not", () => {
  const { rerender } = render(<SweepPlot {...plain} />);
  expect(screen.queryByText(/off scale/)).toBeNull();
  rerender(<SweepPlot {...plain} yDomain={[6, 16]} />);
  expect(screen.getByText("↑ off scale")).toBeTruthy();
  rerender(<SweepPlot {...plain} yDomain={[10, 26]} />);
  expect(screen.getByText("↓ off scale")).toBeTruthy();
});

test("the target shows its band, its limit and its forbidden side", () => {
  const target = {
    band: { from: 156e6, to: 162e6, label: "156 – 162 MHz" },
    limit: { value: 18, forbidden: "below", label: "target 18.0" } as const,
  };
  const { container } = render(<SweepPlot {...plain} {...target} />);
  const column = container.querySelector('rect[fill="var(--sailcloth)"]');
  const hatch = container.querySelector('rect[fill="url(#rw-hatch-fail)"]');
  const height = (element: Element | null) => Number(element?.getAttribute("height"));
  const y = (element: Element | null) => Number(element?.getAttribute("y"));
  // Below 18 lie 12 of the 20 dB of the frame, and they end at its foot.
  expect(height(hatch) / height(column)).toBeCloseTo(12 / 20, 2);
  expect(y(hatch) + height(hatch)).toBeCloseTo(y(column) + height(column), 1);
  expect(screen.getByText("target 18.0")).toBeTruthy();
});

test("arrow keys read out every series at one place after the other", () => {
  render(
    <CursorProvider>
      <SweepPlot {...plain} />
    </CursorProvider>,
  );
  const plot = screen.getByRole("group", { name: /Arrow keys/ });
  fireEvent.keyDown(plot, { key: "ArrowRight" });
  fireEvent.keyDown(plot, { key: "ArrowRight" });
  expect(screen.getByText("15.7 at the radio")).toBeTruthy();
  fireEvent.keyDown(plot, { key: "ArrowRight" });
  expect(screen.getByText("– at the whip")).toBeTruthy();
  fireEvent.keyDown(plot, { key: "Escape" });
  expect(screen.queryByText("– at the whip")).toBeNull();
});

test("two plots of one page read out at the same place", () => {
  render(
    <CursorProvider>
      <SweepPlot {...plain} />
      <SweepPlot {...plain} series={[{ id: "loss", label: "loss", look: 1, values: [1, 2, 3, 4] }]} />
    </CursorProvider>,
  );
  fireEvent.keyDown(screen.getAllByRole("group", { name: /Arrow keys/ })[0] as Element, { key: "ArrowLeft" });
  expect(screen.getByText("17.0 at the radio")).toBeTruthy();
  expect(screen.getByText("4.0 loss")).toBeTruthy();
});

test("the figures switch replaces a chart with the same data as a table, and back", () => {
  render(
    <ChartFrame
      title="Return loss"
      summary="Falls to 15.7 dB."
      figures={{ head: ["MHz", "dB"], rows: [[156, "15.7"]] }}
    >
      <p>the picture</p>
    </ChartFrame>,
  );
  fireEvent.click(screen.getByRole("button", { name: "Figures" }));
  expect(screen.queryByText("the picture")).toBeNull();
  expect(screen.getByRole("columnheader", { name: "MHz" })).toBeTruthy();
  expect(screen.getByRole("cell", { name: "15.7" })).toBeTruthy();
  fireEvent.click(screen.getByRole("button", { name: "Picture" }));
  expect(screen.getByRole("group", { name: "Falls to 15.7 dB." }).textContent).toBe("the picture");
});
