import { act, cleanup, fireEvent, render, screen } from "@testing-library/react";
import type { ReactElement } from "react";
import { afterEach, beforeEach, expect, test } from "vitest";
import { InputField } from "@/components/calculators/input-field";
import { useCalculator } from "@/components/calculators/use-calculator";
import { readAddress, type Parameters } from "@/lib/calculators/address";
import { valuesOf } from "@/lib/calculators/input";
import { pad, padInputs } from "@/lib/calculators/pad";
import { mismatch, mismatchInputs } from "@/lib/calculators/mismatch";
import * as reader from "@/lib/format/read-quantity";

afterEach(cleanup);
beforeEach(() => window.history.replaceState(null, "", "/"));

function PadRig({ parameters }: { parameters: Parameters }) {
  const address = readAddress(padInputs, parameters, reader);
  const opened = { ...address, values: valuesOf(padInputs, address.texts, reader), line: null };
  const calculator = useCalculator({ path: "/calculate/pad", inputs: padInputs, compute: pad }, opened);
  return (
    <>
      <InputField of={calculator} name="loss" />
      <InputField of={calculator} name="source" />
      <InputField of={calculator} name="power" />
      <output>{calculator.result?.shapes[0].exact.loadW.toFixed(4) ?? "nothing"}</output>
    </>
  );
}

function MismatchRig() {
  const address = readAddress(mismatchInputs, {}, reader);
  const opened = { ...address, values: valuesOf(mismatchInputs, address.texts, reader), line: null };
  const calculator = useCalculator({ path: "/calculate/mismatch", inputs: mismatchInputs, compute: mismatch }, opened);
  return (
    <>
      <InputField of={calculator} name="given" />
      <InputField of={calculator} name="vswr" />
      <InputField of={calculator} name="returnLoss" />
      <output>{calculator.result?.magnitude.toFixed(4)}</output>
    </>
  );
}

/** The page as it stands once it has fetched what reads quantities. */
async function open(page: ReactElement): Promise<void> {
  render(page);
  await act(async () => void (await import("@/lib/format/read-quantity")));
}

const type = (label: string, text: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
const shown = () => screen.getByRole("status").textContent;
const address = () => window.location.pathname + window.location.search;

test("figures follow every letter, and so does the address, with the texts as they were typed", async () => {
  await open(<PadRig parameters={{}} />);
  expect(shown()).toBe("0.1000");
  type("Power into the pad", "43 dBm");
  expect(shown()).toBe("1.9953");
  expect(screen.getByText(/= 19\.9526/)).toBeDefined();
  expect(address()).toBe("/calculate/pad?loss=10&source=50&load=50&power=43+dBm");
});

test("a text that cannot be read stays with its sentence; figures and address are those before it", async () => {
  await open(<PadRig parameters={{}} />);
  type("Loss", "10 parsnips");
  expect(screen.getByLabelText("Loss")).toHaveProperty("value", "10 parsnips");
  expect(screen.getByText(/“parsnips” is not a unit of loss/)).toBeDefined();
  expect(shown()).toBe("0.1000");
  type("Power into the pad", "2 W");
  expect(shown()).toBe("0.2000");
  expect(address()).toContain("loss=10&");
  type("Loss", "20");
  expect(shown()).toBe("0.0200");
});

test("what can be read but not be built is said at its field, and the figures before it stay", async () => {
  await open(<PadRig parameters={{}} />);
  type("Loss", "4");
  expect(shown()).toBe("0.3981");
  type("Source side", "75");
  expect(screen.getByText(/At least 5\.72/)).toBeDefined();
  expect(shown()).toBe("0.3981");
  expect(address()).toContain("source=50");
  type("Loss", "10");
  expect(screen.queryByText(/At least/)).toBeNull();
  expect(address()).toContain("loss=10&source=75");
});

test("an address that asks for what cannot be built opens with the sentence and no figures", async () => {
  await open(<PadRig parameters={{ loss: "4", source: "75" }} />);
  expect(screen.getByText(/At least 5\.72/)).toBeDefined();
  expect(shown()).toBe("nothing");
});

test("the arrow keys step a figure in its second digit, with Shift by ten steps", async () => {
  await open(<PadRig parameters={{}} />);
  fireEvent.keyDown(screen.getByLabelText("Loss"), { key: "ArrowUp" });
  expect(screen.getByLabelText("Loss")).toHaveProperty("value", "11");
  fireEvent.keyDown(screen.getByLabelText("Loss"), { key: "ArrowDown", shiftKey: true });
  expect(screen.getByLabelText("Loss")).toHaveProperty("value", "1");
});

test("only what is known is asked for, and what was typed before is still there when it is known again", async () => {
  await open(<MismatchRig />);
  type("VSWR", "3");
  expect(shown()).toBe("0.5000");
  type("Known", "returnLoss");
  expect(screen.queryByLabelText("VSWR")).toBeNull();
  expect(address()).not.toContain("vswr=3");
  type("Known", "vswr");
  expect(screen.getByLabelText("VSWR")).toHaveProperty("value", "3");
  expect(shown()).toBe("0.5000");
});

test("what is typed before the reader of quantities is there is read as soon as it is", async () => {
  render(<PadRig parameters={{}} />);
  expect(shown()).toBe("0.1000");
  type("Power into the pad", "0.2 kW");
  expect(screen.getByLabelText("Power into the pad")).toHaveProperty("value", "0.2 kW");
  expect(shown()).toBe("0.1000");
  await act(async () => void (await import("@/lib/format/read-quantity")));
  expect(shown()).toBe("20.0000");
  expect(address()).toContain("power=0.2+kW");
});
