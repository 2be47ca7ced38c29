"use client";

import { useEffect, useRef } from "react";

export interface GroundField {
  positionsM: readonly number[];
  rows: number;
  /** row by row, as many a row as there are positions */
  aboveSettledV: Float32Array;
}

interface LatticeGroundProps {
  field: GroundField;
  /** px of a distance, from the left edge of the drawing */
  x: (distanceM: number) => number;
  width: number;
  height: number;
  /** volt that is drawn in full colour */
  fullV: number;
}

/** A colour of the page as red, green and blue; it follows the theme. */
function colourOf(element: HTMLElement, name: string): [number, number, number] {
  element.style.color = `var(${name})`;
  const [red = 0, green = 0, blue = 0] = (getComputedStyle(element).color.match(/[\d.]+/g) ?? []).map(Number);
  return [red, green, blue];
}

/** Between the columns of the field, at a px column. */
function columnsAt({ positionsM }: GroundField, x: LatticeGroundProps["x"], width: number) {
  const places = positionsM.map(x);
  let n = 0;
  return Array.from({ length: width }, (_, px) => {
    while (n < places.length - 2 && places[n + 1]! < px) n++;
    const [from, to] = [places[n] ?? 0, places[n + 1] ?? 0];
    return { n, part: to > from ? Math.max(0, Math.min(1, (px - from) / (to - from))) : 0 };
  });
}

function paint(canvas: HTMLCanvasElement, { field, x, width, fullV }: LatticeGroundProps): void {
  const context = canvas.getContext("2d");
  if (!context || !(fullV > 0)) return;
  const [sea, copper] = [colourOf(canvas, "--sea"), colourOf(canvas, "--copper-fill")];
  const image = context.createImageData(width, field.rows);
  const columns = columnsAt(field, x, width);
  const perRow = field.positionsM.length;
  for (let row = 0; row < field.rows; row++)
    for (let px = 0; px < width; px++) {
      const { n, part } = columns[px]!;
      const at = row * perRow + n;
      const volt = field.aboveSettledV[at]! * (1 - part) + (field.aboveSettledV[at + 1] ?? 0) * part;
      const [red, green, blue] = volt < 0 ? sea : copper;
      image.data.set([red, green, blue, 150 * Math.min(1, Math.abs(volt) / fullV)], 4 * (row * width + px));
    }
  context.putImageData(image, 0, 0);
}

/** The ground of the lattice: sea where the line is below its settled level, copper where it is above. */
export function LatticeGround(props: LatticeGroundProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const element = canvas.current;
    if (!element) return undefined;
    const repaint = () => paint(element, props);
    repaint();
    // Pixels do not follow the theme by themselves.
    const observer = new MutationObserver(repaint);
    observer.observe(document.documentElement, { attributeFilter: ["data-theme"] });
    const scheme = window.matchMedia("(prefers-color-scheme: dark)");
    scheme.addEventListener("change", repaint);
    return () => {
      observer.disconnect();
      scheme.removeEventListener("change", repaint);
    };
  });
  const { width, height, field } = props;
  return (
    <canvas
      ref={canvas}
      width={width}
      height={field.rows}
      aria-hidden="true"
      className="absolute top-0 left-0 block"
      style={{ width, height }}
    />
  );
}
