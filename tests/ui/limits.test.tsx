import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { LimitList } from "@/components/limits/limit-list";
import { limitSentence } from "@/components/limits/limit-words";
import { newLimit, newPiece, refusalSentences, typedLine } from "@/components/limits/typed-limit";
import { QueryProvider } from "@/components/team/query-provider";
import { type LimitLineItem, newLimitLineSchema } from "@/lib/limit-lines/schema";
import { newLimitLine } from "@/tests/support/limit-lines";

const item = (id: string, change: Partial<LimitLineItem> = {}): LimitLineItem => ({
  ...newLimitLine(`Line ${id}`),
  ...{
    id,
    isStandard: true,
    mark: "memory",
    addedByName: null,
    addedAt: null,
    note: "From memory: check your edition.",
  },
  ...change,
});
const own = item("own", {
  ...{ isStandard: false, mark: null, addedByName: "Nils Ferrant", addedAt: "2026-03-01T12:00:00.000Z", note: "" },
});

let held: LimitLineItem[];
let sent: { method: string; address: string; body: unknown }[];
let refusal: object | undefined;

beforeEach(() => {
  [held, sent, refusal] = [[item("6"), own], [], undefined];
  // jsdom has no dialogs.
  HTMLDialogElement.prototype.showModal = function (this: HTMLDialogElement) {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function (this: HTMLDialogElement) {
    this.open = false;
  };
  vi.stubGlobal("fetch", async (address: string, { method = "GET", body }: RequestInit) => {
    if (method !== "GET") sent.push({ method, address, body: typeof body === "string" ? JSON.parse(body) : undefined });
    if (refusal)
      return Response.json(refusal, { status: 422, headers: { "Content-Type": "application/problem+json" } });
    if (method === "DELETE") held = held.filter(({ id }) => !address.endsWith(`/${id}`));
    return method === "DELETE" ? new Response(null, { status: 204 }) : Response.json({ items: held });
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const show = (canWrite: boolean) =>
  render(
    <QueryProvider>
      <LimitList first={held} canWrite={canWrite} />
    </QueryProvider>,
  );

describe("The list of limit lines", () => {
  test("says what each asks for, where it is from, and what is only recalled", () => {
    show(false);
    expect(screen.getByRole("status").textContent).toBe("1 of the standards, 1 of your team");
    const [first, second] = screen.getAllByRole("listitem");
    expect(first?.textContent).toContain("Line own");
    expect(first?.textContent).toContain(
      "House specification 12, 3, 2025, clause 4.2 · added by Nils Ferrant, 2026-03-01",
    );
    expect(second?.textContent).toContain("check your edition");
    expect(screen.queryByRole("button")).toBeNull();
  });

  test("puts limits into sentences: ceilings and floors, at both ends, per length, in people's units", () => {
    const said = (change: Partial<LimitLineItem>) => limitSentence(item("x", change)).replaceAll("\u00a0", " ");
    expect(said({})).toBe("at most 2.02 dB at 1 MHz, 21.01 dB at 100 MHz, per 100 m");
    const constant = (value: number) => ({ perLengthM: undefined, curve: { form: "constant" as const, value } });
    expect(said({ quantity: "skew", ...constant(50e-9) })).toBe("at most 50 ns");
    expect(said({ quantity: "returnLoss", ...constant(10) })).toBe("at least 10 dB");
    expect(said({ quantity: "dcLoop", ...constant(25) })).toBe("at most 25 Ω");
  });

  test("lets a librarian remove the team's own, after asking, and never a standard's", async () => {
    show(true);
    expect(screen.queryByRole("button", { name: "Remove Line 6" })).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "Remove Line own" }));
    expect(sent).toEqual([]);
    fireEvent.click(await screen.findByRole("button", { name: "Remove the line" }));
    await waitFor(() => expect(screen.getAllByRole("listitem")).toHaveLength(1));
    expect(sent).toEqual([{ method: "DELETE", address: "/api/v1/limit-lines/own", body: undefined }]);
  });
});

describe("Adding a line", () => {
  async function open() {
    show(true);
    fireEvent.click(screen.getByRole("button", { name: "Add a line" }));
    return within(await screen.findByRole("form", { name: "Add a limit line" }));
  }
  const type = (form: ReturnType<typeof within>, label: string, value: string) =>
    fireEvent.change(form.getByLabelText(label), { target: { value } });

  test("sends a formula of megahertz and decibels as the API takes it", async () => {
    const form = await open();
    for (const [label, value] of [
      ...[
        ["Name", "Trunk"],
        ["From", "1"],
        ["To", "100"],
        ["k1 · √f, dB", "1,9"],
        ["k2 · f, dB", "0.02"],
      ],
      ...[
        ["Taken from", "House"],
        ["Edition", "3"],
      ],
    ] as [string, string][])
      type(form, label, value);
    fireEvent.click(form.getByRole("button", { name: "Add the line" }));
    await waitFor(() => expect(screen.queryByRole("form")).toBeNull());
    expect(sent[0]?.body).toEqual({
      ...{ name: "Trunk", quantity: "insertionLoss", of: "cable", perLengthM: 100, note: "" },
      curve: { form: "formula", referenceHz: 1e6, pieces: [{ fromHz: 1e6, toHz: 100e6, k1: 1.9, k2: 0.02 }] },
      source: { title: "House", edition: "3", clause: null },
    });
    expect(newLimitLineSchema.safeParse(sent[0]?.body).success).toBe(true);
  });

  test("keeps what was typed when it is refused, with every sentence at its place", async () => {
    const errors = [
      { path: "curve.pieces.0.toHz", message: "A range does not end below where it begins." },
      { path: "name", message: "The name is needed." },
    ];
    const form = await open();
    type(form, "Edition", "3");
    refusal = { title: "Unprocessable Content", status: 422, detail: "2 fields are not right.", errors };
    fireEvent.click(form.getByRole("button", { name: "Add the line" }));
    const alert = await form.findByRole("alert");
    expect(alert.textContent).toContain("Range 1: A range does not end below where it begins.");
    expect(alert.textContent).toContain("The name is needed.");
    expect((form.getByLabelText("Edition") as HTMLInputElement).value).toBe("3");
  });
});

describe("What is typed", () => {
  test("as points or one value in nanoseconds becomes hertz and seconds", () => {
    const points = typedLine({ ...newLimit, quantity: "delay", form: "points", points: "1 570\n\n100;537,6\n" });
    expect(points.curve).toEqual({
      form: "points",
      points: [
        { frequencyHz: 1e6, value: expect.closeTo(570e-9, 20) },
        { frequencyHz: 100e6, value: expect.closeTo(537.6e-9, 20) },
      ],
    });
    const constant = typedLine({ ...newLimit, quantity: "skew", form: "constant", value: "45" });
    expect(constant).toMatchObject({ perLengthM: 100, curve: { form: "constant", value: expect.closeTo(45e-9, 20) } });
    expect(typedLine({ ...newLimit, quantity: "returnLoss" })).not.toHaveProperty("perLengthM");
  });

  test("and cannot be read is refused as no number, never taken for 0", () => {
    const line = typedLine({ ...newLimit, name: "x", title: "y", edition: "z", pieces: [{ ...newPiece, to: "1oo" }] });
    const { error } = newLimitLineSchema.safeParse(line);
    expect(error?.issues.map(({ path }) => path.join("."))).toEqual(["curve.pieces.0.fromHz", "curve.pieces.0.toHz"]);
  });

  test("a refusal without fields is its own sentence", () => {
    expect(refusalSentences({ title: "Conflict", status: 409, detail: "A line with this name exists." })).toEqual([
      "A line with this name exists.",
    ]);
  });
});
