import { act, cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, beforeAll, describe, expect, test, vi } from "vitest";
import { QuantityField } from "@/components/ui/quantity-field";
import { useDraft } from "@/components/ui/use-draft";

afterEach(cleanup);

describe("A quantity that is typed", () => {
  // The field fetches it when somebody is about to type; here it need not be waited for.
  beforeAll(async () => {
    await import("@/lib/format/read-quantity");
  });

  function Shown({ onValue, isOptional }: { onValue: (value: number | undefined) => void; isOptional?: boolean }) {
    const [value, setValue] = useState<number | undefined>(0.01);
    return (
      <QuantityField
        label="Diameter"
        kind="length"
        usualUnit="mm"
        value={value}
        text={(metres) => String(metres * 1000)}
        isOptional={isOptional}
        onValue={(next) => {
          setValue(next);
          onValue(next);
        }}
        refuse={(metres) => (metres > 1 ? "At most a metre." : undefined)}
      />
    );
  }
  const field = () => screen.getByRole<HTMLInputElement>("textbox", { name: "Diameter" });
  const type = (text: string) => fireEvent.change(field(), { target: { value: text } });

  test("takes a bare figure in its usual unit and any other unit as it is typed, with what was understood", async () => {
    const onValue = vi.fn();
    render(<Shown onValue={onValue} />);
    expect(field().value).toBe("10");
    type("7");
    await vi.waitFor(() => expect(onValue).toHaveBeenLastCalledWith(0.007));
    type("0.3 in");
    await vi.waitFor(() => expect(onValue.mock.lastCall?.[0]).toBeCloseTo(0.00762, 9));
    expect(screen.getByText(/^= 7\.62/)).toBeTruthy();
    fireEvent.blur(field());
    expect(field().value).toBe("7.62");
  });

  test("keeps what cannot be read, with a sentence, and hands nothing on", async () => {
    const onValue = vi.fn();
    render(<Shown onValue={onValue} />);
    type("thick");
    expect(await screen.findByText(/“thick” is not a length/)).toBeTruthy();
    fireEvent.blur(field());
    expect(field().value).toBe("thick");
    type("2000");
    expect(await screen.findByText("At most a metre.")).toBeTruthy();
    expect(onValue).not.toHaveBeenCalled();
    fireEvent.keyDown(field(), { key: "Escape" });
    expect(field().value).toBe("10");
  });

  test("that may be missing is, once the field is empty; another is asked for", async () => {
    const onValue = vi.fn();
    const { unmount } = render(<Shown onValue={onValue} isOptional />);
    type("");
    await vi.waitFor(() => expect(onValue).toHaveBeenCalledWith(undefined));
    unmount();
    render(<Shown onValue={onValue} />);
    type("");
    expect(await screen.findByText(/Type a length/)).toBeTruthy();
  });

  test("steps with the arrow keys", async () => {
    const onValue = vi.fn();
    render(<Shown onValue={onValue} />);
    fireEvent.keyDown(field(), { key: "ArrowUp" });
    await vi.waitFor(() => expect(onValue).toHaveBeenLastCalledWith(0.011));
  });
});

describe("A draft", () => {
  afterEach(() => {
    vi.useRealTimers();
  });

  function Field({ value, commit }: { value: string; commit: (value: string) => void }) {
    const draft = useDraft(value, commit, 100);
    return <input value={draft.shown} onChange={(event) => draft.change(event.target.value)} onBlur={draft.settle} />;
  }
  const input = () => screen.getByRole<HTMLInputElement>("textbox");
  const type = (text: string) => fireEvent.change(input(), { target: { value: text } });
  const rest = (ms: number) => act(() => vi.advanceTimersByTime(ms));

  test("is handed on once it has rested, and what comes back late of it does not disturb what is typed since", () => {
    vi.useFakeTimers();
    const commit = vi.fn();
    const { rerender } = render(<Field value="" commit={commit} />);
    type("f");
    rest(50);
    type("fo");
    rest(100);
    expect(commit.mock.calls).toEqual([["fo"]]);
    type("foa");
    rest(100);
    type("foam");
    rerender(<Field value="fo" commit={commit} />);
    expect(input().value).toBe("foam");
    rerender(<Field value="foa" commit={commit} />);
    expect(input().value).toBe("foam");
    rest(100);
    rerender(<Field value="foam" commit={commit} />);
    expect([input().value, commit.mock.lastCall]).toEqual(["foam", ["foam"]]);
  });

  test("gives way to a value from elsewhere", () => {
    vi.useFakeTimers();
    const { rerender } = render(<Field value="a" commit={() => undefined} />);
    type("ab");
    rerender(<Field value="from the address" commit={() => undefined} />);
    expect(input().value).toBe("from the address");
  });

  test("is handed on at once where the hand lets go", () => {
    vi.useFakeTimers();
    const commit = vi.fn();
    render(<Field value="" commit={commit} />);
    type("x");
    fireEvent.blur(input());
    expect(commit.mock.calls).toEqual([["x"]]);
    rest(500);
    expect(commit).toHaveBeenCalledTimes(1);
  });
});
