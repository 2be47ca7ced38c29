import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useForm } from "react-hook-form";
import { afterEach, expect, test, vi } from "vitest";
import { Button } from "@/components/ui/button";
import { Confirm } from "@/components/ui/confirm";
import { Field } from "@/components/ui/field";
import { Figure } from "@/components/ui/figure";
import { initials } from "@/components/ui/member-disc";
import { Reading } from "@/components/ui/reading";
import { themeOf } from "@/components/ui/theme";
import { ThemeSwitch } from "@/components/ui/theme-switch";

afterEach(cleanup);

test("a refused button stays in reach, does nothing, and says why", () => {
  const onClick = vi.fn();
  render(
    <Button onClick={onClick} refused="Only a librarian approves.">
      Approve
    </Button>,
  );
  const button = screen.getByRole("button", { name: "Approve" });
  fireEvent.click(button);
  expect(onClick).not.toHaveBeenCalled();
  expect(button.getAttribute("aria-disabled")).toBe("true");
  expect(document.getElementById(button.getAttribute("aria-describedby") ?? "")?.textContent).toBe(
    "Only a librarian approves.",
  );
  expect((button as HTMLButtonElement).disabled).toBe(false);
});

test("a refused button inside a form does not send it", () => {
  const onSubmit = vi.fn((event: React.FormEvent) => event.preventDefault());
  render(
    <form onSubmit={onSubmit}>
      <Button type="submit" refused="Wait.">
        Send
      </Button>
    </form>,
  );
  fireEvent.click(screen.getByRole("button"));
  expect(onSubmit).not.toHaveBeenCalled();
});

test("a field in error is marked and described by what is wrong, in place of its hint", () => {
  const { rerender } = render(<Field label="Length" unit="m" hint="between braid ends" />);
  const field = () => screen.getByRole("textbox", { name: "Length" });
  const note = () => document.getElementById(field().getAttribute("aria-describedby") ?? "")?.textContent;
  expect([field().getAttribute("aria-invalid"), note()]).toEqual([null, "between braid ends"]);
  rerender(<Field label="Length" unit="m" hint="between braid ends" error="more than 0" />);
  expect([field().getAttribute("aria-invalid"), note()]).toEqual(["true", "more than 0"]);
  expect(screen.queryByText("between braid ends")).toBeNull();
});

test("a field takes React Hook Form's register and hands its value to the form", async () => {
  const sent = vi.fn();
  function Form() {
    const { register, handleSubmit } = useForm({ defaultValues: { lengthM: "1.80" } });
    return (
      <form onSubmit={handleSubmit((values) => sent(values))}>
        <Field label="Length" {...register("lengthM")} />
        <Button type="submit">Keep</Button>
      </form>
    );
  }
  render(<Form />);
  fireEvent.input(screen.getByRole("textbox"), { target: { value: "2.05" } });
  fireEvent.click(screen.getByRole("button"));
  await vi.waitFor(() => expect(sent).toHaveBeenCalledWith({ lengthM: "2.05" }));
});

test("a figure shows its unit and speaks it in words", () => {
  const { container } = render(<Figure digits="15.7" unit="dB" spoken="decibels" />);
  expect(container.querySelector('[aria-hidden="true"]')?.textContent).toBe("dB");
  expect(container.querySelector(".sr-only")?.textContent).toBe(" decibels");
});

test("a reading says in a word what its mark shows", () => {
  render(
    <dl>
      <Reading label="Return loss" digits="15.7" unit="dB" state="fail" target="at least 18.0" />
    </dl>,
  );
  expect(screen.getByText("missed:")).toBeTruthy();
});

test("the theme switch lights the page at once and leaves a cookie for the server", () => {
  document.documentElement.dataset.theme = "paper";
  render(<ThemeSwitch />);
  expect(screen.getByRole<HTMLInputElement>("radio", { name: "Light" }).checked).toBe(true);
  fireEvent.click(screen.getByRole("radio", { name: "Tar" }));
  expect(document.documentElement.dataset.theme).toBe("tar");
  expect(document.cookie).toContain("theme=tar");
  expect(screen.getByRole<HTMLInputElement>("radio", { name: "Tar" }).checked).toBe(true);
});

test("an unknown theme in the cookie means as the system", () => {
  expect([themeOf("tar"), themeOf("paper"), themeOf("pink"), themeOf(undefined)]).toEqual([
    "tar",
    "paper",
    "system",
    "system",
  ]);
});

test("a closed question is not on the page, and its buttons answer it", () => {
  // jsdom has dialogs but cannot open them as modal.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true;
  };
  const [onConfirm, onCancel] = [vi.fn(), vi.fn()];
  const question = { title: "Remove the mast tail?", confirmLabel: "Remove it", onConfirm, onCancel };
  const { rerender } = render(<Confirm isOpen={false} {...question} />);
  expect(screen.queryByRole("dialog")).toBeNull();
  rerender(<Confirm isOpen {...question} />);
  expect(screen.getByRole("dialog", { name: "Remove the mast tail?" })).toBeTruthy();
  fireEvent.click(screen.getByRole("button", { name: "Remove it" }));
  fireEvent.click(screen.getByRole("button", { name: "Keep it" }));
  expect([onConfirm.mock.calls.length, onCancel.mock.calls.length]).toEqual([1, 1]);
});

test.each([
  ["Ines Hartwell", "IH"],
  ["  ada  maria winslade ", "AW"],
  ["Cormac", "C"],
  ["", ""],
])("initials(%j) is %j", (name, expected) => {
  expect(initials(name)).toBe(expected);
});
