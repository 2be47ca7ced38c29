import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, describe, expect, test } from "vitest";
import { decadesAround } from "@/components/plot/axes";
import { partOf } from "@/components/plot/curve-paths";
import { CurvePlot } from "@/components/plot/curve-plot";

afterEach(cleanup);

const at = { xs: [1, 2, 3, 4, 5], x: (v: number) => v * 10, y: (v: number) => v };
const values = [1, 1, 1, 1, 1];

describe("A curve", () => {
  test("is solid where the data reach, dotted before and after, and the two meet", () => {
    const data = [2, 4] as const;
    expect(partOf("within", at, { values, data })).toBe("M20.0 1.0L30.0 1.0L40.0 1.0");
    expect(partOf("beyond", at, { values, data })).toBe("M10.0 1.0L20.0 1.0M40.0 1.0L50.0 1.0");
  });

  test("without any data is dotted throughout, and solid where nobody says how far they reach", () => {
    expect(partOf("within", at, { values, data: null })).toBe("");
    expect(partOf("beyond", at, { values, data: null }).match(/[ML]/g)).toHaveLength(5);
    expect(partOf("within", at, { values }).match(/[ML]/g)).toHaveLength(5);
  });

  test("leaves out what could not be computed", () => {
    expect(partOf("within", at, { values: [1, null, 1, NaN, 1] })).toBe("M10.0 1.0M30.0 1.0M50.0 1.0");
  });
});

test.each([
  [
    [0.4, 14.2],
    [0.2, 20],
  ],
  [
    [1, 10],
    [1, 10],
  ],
  [
    [3, 3],
    [2, 5],
  ],
  [
    [0, null, -1],
    [0.1, 10],
  ],
  [
    [1e-9, 1e9],
    [1e-9, 1e9],
  ],
])("decadesAround(%j) is %j", (values, ends) => {
  const [low, high] = decadesAround(values);
  expect(low).toBeCloseTo(ends[0]!, 12);
  expect(high / ends[1]!).toBeCloseTo(1, 9);
});

test("A plot names its curves at their ends and draws nothing that is not a number, whatever the values", () => {
  const { container } = render(
    <CurvePlot
      xs={[1e6, 1e7, 1e8]}
      series={[
        { id: "a", label: "C50-F10", look: 1, values: [0.4, 1.3, 4.1], data: [1e7, 1e8] },
        { id: "b", label: "empty", look: 2, values: [0, null, NaN] },
      ]}
      xDomain={[1e6, 1e8]}
      yDomain={[0.1, 10]}
      formatX={String}
      formatY={String}
      mark={1e7}
      points={[{ x: 1e7, y: 1.3, shape: "ring" }]}
      limit={{ x: 5e7, label: "rated" }}
      xUnit="Hz"
    />,
  );
  expect(screen.getByText("C50-F10")).toBeTruthy();
  expect(screen.getByText("rated")).toBeTruthy();
  expect(container.innerHTML).not.toMatch(/NaN|Infinity/);
});
