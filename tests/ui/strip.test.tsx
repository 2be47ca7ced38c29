import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, expect, test, vi } from "vitest";
import { Strip } from "@/components/line/strip";
import { scaleOfPieces, type StripPiece } from "@/components/line/strip-piece";

afterEach(cleanup);

const cable = { construction: null, build: null, outerDiameterMm: 5 };
const pieces: StripPiece[] = [
  { id: "a", kind: "cable", label: "C50-S5", lengthM: 2.4, cable, spoken: "C50-S5, 2.40 metres" },
  { id: "b", kind: "joint", label: "J1 cabinet", spoken: "J1 cabinet, 0.07 decibels" },
  { id: "c", kind: "cable", label: "C50-F10", lengthM: 38.6, cable, spoken: "C50-F10, 38.60 metres" },
];

interface RigProps {
  drawn?: StripPiece[];
  onMove?: (from: number, to: number) => void;
  onOpen?: (index: number) => void;
}

function Rig({ drawn = pieces, onMove, onOpen }: RigProps) {
  const [selected, setSelected] = useState<number | null>(null);
  return (
    <Strip
      pieces={drawn}
      source={{ kind: "generator", label: "Radio" }}
      load={{ kind: "antenna", label: "Whip" }}
      scale={scaleOfPieces(drawn, 68, 1302)}
      width={1384}
      selected={selected}
      onSelect={setSelected}
      onMove={onMove}
      onOpen={onOpen}
    />
  );
}

const names = () => screen.getAllByRole("button").map((button) => button.getAttribute("aria-label"));
const pressed = () => screen.getAllByRole("button").findIndex((b) => b.getAttribute("aria-pressed") === "true");

test("the strip reads as a list of its pieces, each with its place, in order from source to load", () => {
  render(<Rig />);
  expect(screen.getByRole("list", { name: "The line from Radio to Whip" })).toBeTruthy();
  expect(names()).toEqual([
    "1 of 3, C50-S5, 2.40 metres",
    "2 of 3, J1 cabinet, 0.07 decibels",
    "3 of 3, C50-F10, 38.60 metres",
  ]);
});

test("the strip is one stop of the tab key, and arrows go from piece to piece and stop at the ends", () => {
  render(<Rig />);
  expect(screen.getAllByRole("button").filter((button) => button.tabIndex === 0)).toHaveLength(1);
  const [first, second, third] = screen.getAllByRole("button");
  fireEvent.keyDown(first as Element, { key: "ArrowRight" });
  expect([pressed(), document.activeElement]).toEqual([1, second]);
  fireEvent.keyDown(second as Element, { key: "ArrowRight" });
  fireEvent.keyDown(third as Element, { key: "ArrowRight" });
  expect([pressed(), document.activeElement]).toEqual([2, third]);
  fireEvent.keyDown(third as Element, { key: "ArrowLeft" });
  expect(pressed()).toBe(1);
});

test("Alt with an arrow moves a piece to its neighbour's place and keeps it selected", () => {
  const onMove = vi.fn();
  render(<Rig onMove={onMove} />);
  fireEvent.keyDown(screen.getAllByRole("button")[0] as Element, { key: "ArrowRight", altKey: true });
  expect(onMove).toHaveBeenCalledExactlyOnceWith(0, 1);
  expect(pressed()).toBe(1);
});

test("on a line that cannot be changed Alt with an arrow does nothing", () => {
  render(<Rig />);
  fireEvent.keyDown(screen.getAllByRole("button")[0] as Element, { key: "ArrowRight", altKey: true });
  expect(pressed()).toBe(-1);
});

test("Enter selects a piece and opens its editor", () => {
  const onOpen = vi.fn();
  render(<Rig onOpen={onOpen} />);
  fireEvent.keyDown(screen.getAllByRole("button")[2] as Element, { key: "Enter" });
  expect(onOpen).toHaveBeenCalledExactlyOnceWith(2);
  expect(pressed()).toBe(2);
});

test("what is wrong with a piece is said at its place and to a screen reader", () => {
  const tail: StripPiece = {
    id: "d",
    kind: "cable",
    label: "Mast tail",
    lengthM: null,
    cable,
    fault: "length missing",
    spoken: "Mast tail",
  };
  const { container } = render(<Rig drawn={[...pieces, tail]} />);
  expect(names().at(-1)).toBe("4 of 4, Mast tail, length missing");
  expect(container.querySelector("svg")?.textContent).toContain("length missing");
  expect(container.querySelector('rect[fill="url(#rw-hatch-fail)"]')).not.toBeNull();
});

test("every place that can be pressed is at least 24 px wide, however short its piece", () => {
  const short = { ...pieces[0], id: "s", lengthM: 0.001 } as StripPiece;
  render(<Rig drawn={[short, ...pieces]} />);
  for (const button of screen.getAllByRole("button"))
    expect(Number.parseFloat(button.style.width)).toBeGreaterThanOrEqual(24);
});

test("an empty line still shows where it begins and ends", () => {
  const { container } = render(<Rig drawn={[]} />);
  const words = container.querySelector("svg")?.textContent;
  expect(words).toContain("Radio");
  expect(words).toContain("Whip");
  expect(words).toContain("no cable yet");
});
