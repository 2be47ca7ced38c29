import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { EntryEditor } from "@/components/cables/editor/entry-editor";
import { editedEntry } from "@/lib/cables/editor/entry-draft";
import { draftOf } from "@/lib/cables/editor/send-entry";
import { emptyTexts, type EntryTexts } from "@/lib/cables/editor/texts";
import type { CableRevision } from "@/lib/cables/revisions/schema";

// Many keys and waits each; a busy machine takes its time over them.
vi.setConfig({ testTimeout: 60_000 });

const router = { push: vi.fn(), replace: vi.fn(), refresh: vi.fn() };
vi.mock("next/navigation", () => ({ useRouter: () => router }));

const texts: EntryTexts = {
  ...emptyTexts,
  ...{ designation: "C75-F9", name: "75 Ω trunk" },
  figures: {
    ...emptyTexts.figures,
    ...{ conductor: "1.02", insulation: "4.6", permittivity: "1.4516", tangent: "0.00015", outer: "6.9" },
    ...{ z0: "75", velocity: "0.83", c: "67", loop: "30.1", core: "21.1" },
  },
};

function revisionOf(of: EntryTexts, version: number): CableRevision {
  const draft = editedEntry(of, null).draft!;
  return {
    ...JSON.parse(JSON.stringify(draft)),
    ...{ id: "c75-f9", revision: 1, version, state: "draft", condition: null, preferred: false, successor: null },
    ...{ isCurrent: true, reason: "First entry.", authorId: "libby", authorName: "Libby Thornquist", checks: [] },
    ...{ createdAt: "2026-12-01T09:00:00.000Z", submittedAt: null, approvedByName: null, approvedAt: null },
  } as CableRevision;
}

interface Sent {
  method: string;
  path: string;
  body: Record<string, unknown>;
  ifMatch: string | null;
}

/** A server that answers what it is told and keeps what it was asked. */
function serve(answer: (sent: Sent) => { status: number; body: unknown }): Sent[] {
  const all: Sent[] = [];
  vi.stubGlobal("fetch", (address: string, init: RequestInit = {}) => {
    const sent = {
      method: init.method ?? "GET",
      path: address.replace("/api/v1", ""),
      body: JSON.parse((init.body as string | undefined) ?? "{}") as Record<string, unknown>,
      ifMatch: new Headers(init.headers).get("If-Match"),
    };
    if (sent.method !== "GET") all.push(sent);
    const { status, body } = answer(sent);
    const type = status < 300 ? "application/json" : "application/problem+json";
    return Promise.resolve(new Response(JSON.stringify(body), { status, headers: { "Content-Type": type } }));
  });
  return all;
}

const uses = { status: 200, body: { cableId: "c75-f9", designation: "C75-F9", revision: 1, total: 0, items: [] } };

async function show(revision: CableRevision | null) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  render(
    <QueryClientProvider client={client}>
      <EntryEditor revision={revision} person={{ id: "libby", name: "Libby Thornquist" }} />
    </QueryClientProvider>,
  );
  await rest(0);
}

// By label: finding a role in so large a form takes a second in this document.
const field = (name: string | RegExp) => screen.getByLabelText<HTMLInputElement>(name, { exact: true });
async function type(name: string | RegExp, value: string) {
  await act(async () => {
    fireEvent.change(field(name), { target: { value } });
    await Promise.resolve();
  });
}
const checks = () => within(screen.getByLabelText("Checks"));
const button = (name: string) => screen.getByText(name, { selector: "button" });

/** Time goes by. */
const rest = (ms: number) =>
  act(async () => {
    await new Promise((resolve) => setTimeout(resolve, ms));
  });

beforeEach(() => {
  window.localStorage.clear();
  const opened = (isOpen: boolean) =>
    function (this: HTMLDialogElement) {
      this.open = isOpen;
    };
  Object.assign(HTMLDialogElement.prototype, { showModal: opened(true), close: opened(false) });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
});

describe("A new entry", () => {
  test("is checked while it is typed: the figure that does not fit is named, and corrected it agrees", async () => {
    serve(() => uses);
    await show(null);
    expect(
      screen.getByText(/Nothing given says the impedance and the velocity yet/, { selector: "section p" }),
    ).toBeTruthy();
    await type("Diameter of the inner conductor", "1.02");
    await type("Diameter of the dielectric", "4.6");
    await type("Permittivity", "1.4516");
    await type("Impedance", "75");
    await type("Velocity factor", "83 %");
    await type("Capacitance", "67");
    expect(checks().getByText(/The odd one is the capacitance: 67\.0 pF\/m is stated/)).toBeTruthy();
    expect(screen.getByText(/things to look at/)).toBeTruthy();
    await type("Capacitance", "53.6");
    expect(checks().queryByText(/odd one/)).toBeNull();
    expect(screen.getByText("agrees with itself")).toBeTruthy();
    expect(screen.getByText("Kept in this browser")).toBeTruthy();
  });

  test("takes a pasted table, says how it was read, and names the mistyped row", async () => {
    serve(() => uses);
    await show(null);
    await type("Impedance", "75");
    await type("Velocity factor", "0.83");
    await type("Dc resistance, loop", "30.1");
    const rows = [
      "5\t1,37",
      "10\t1,94",
      "50\t4,40",
      "100\t6,28",
      "200\t8,98",
      "450\t11,92",
      "900\t19,85",
      "1500\t26,18",
      "3000\t38,48",
    ];
    await type(/Paste rows/, rows.join("\n"));
    expect(screen.getByText("The unit of the frequency is not given: is it MHz or GHz?")).toBeTruthy();
    await act(async () => {
      fireEvent.change(field("Unit of the frequency"), { target: { value: "MHz" } });
      await Promise.resolve();
    });
    await act(async () => {
      fireEvent.change(field("Unit of the loss"), { target: { value: "dB/100 m" } });
      await Promise.resolve();
    });
    expect(screen.getByText("9 rows read as frequency in MHz, loss in dB/100 m, decimal commas.")).toBeTruthy();
    expect(field("Loss of row 6").value).toBe("11.92");
    expect(checks().getByText(/The row at 450.MHz gives 11\.92 dB\/100 m/)).toBeTruthy();
    await type("Loss of row 6", "13.72");
    expect(checks().getByText("Every row goes with the others.")).toBeTruthy();
  });

  test("every change can be undone and done again", async () => {
    serve(() => uses);
    await show(null);
    await type("Impedance", "7");
    await type("Impedance", "75");
    await type("What it is", "trunk");
    fireEvent.click(button("Undo"));
    expect(field("What it is").value).toBe("");
    fireEvent.click(button("Undo"));
    expect(field("Impedance").value).toBe("");
    fireEvent.click(button("Redo"));
    expect(field("Impedance").value).toBe("75");
  });

  test("is kept in the browser: closed and opened again, what was typed is there", async () => {
    serve(() => uses);
    await show(null);
    await type("Designation", "C75-F9");
    cleanup();
    await show(null);
    await rest(0);
    expect(field("Designation").value).toBe("C75-F9");
  });

  test("is made on the server by asking for a draft, with what was typed", async () => {
    const stored = revisionOf(texts, 2);
    const sent = serve(({ method, path }) =>
      method === "POST" ? { status: 201, body: stored } : path.includes("/uses") ? uses : { status: 200, body: stored },
    );
    await show(null);
    await type("Designation", "C75-F9");
    await type("Impedance", "75");
    await type("Velocity factor", "0.83");
    fireEvent.click(button("Save as a draft"));
    await waitFor(() => expect(router.replace).toHaveBeenCalledWith("/cables/c75-f9/edit"));
    expect(sent.map(({ method, path }) => `${method} ${path}`)).toEqual(["POST /cables", "PATCH /cables/c75-f9"]);
    expect(sent[1]).toMatchObject({
      ifMatch: '"2"',
      body: { inputs: { nominal: { z0Ohm: 75, velocityFactor: 0.83 } } },
    });
  });
});

describe("A draft", () => {
  test("is saved a moment after the last key, against the version it was made from, and only what changed", async () => {
    const sent = serve(({ method }) =>
      method === "GET" ? uses : { status: 200, body: revisionOf({ ...texts, name: "a trunk" }, 4) },
    );
    await show(revisionOf(texts, 3));
    await type("What it is", "a trunk");
    await waitFor(() => expect(sent).toHaveLength(1), { timeout: 3000 });
    expect(sent[0]).toMatchObject({
      method: "PATCH",
      path: "/cables/c75-f9",
      ifMatch: '"3"',
      body: { name: "a trunk" },
    });
    expect(Object.keys(sent[0]!.body)).toEqual(["name"]);
    await waitFor(() => expect(screen.getByText("Saved")).toBeTruthy());
    expect(window.localStorage.length).toBe(0);
  });

  test("changed by somebody else meanwhile shows both versions, and mine goes on top of theirs", async () => {
    const theirs = { ...texts, figures: { ...texts.figures, z0: "74.9" } };
    const sent = serve(({ method, ifMatch, body }) => {
      if (method === "GET") return uses;
      if (ifMatch === '"3"')
        return {
          status: 412,
          body: { title: "Stale", status: 412, detail: "Changed meanwhile.", current: revisionOf(theirs, 5) },
        };
      return { status: 200, body: { ...revisionOf(theirs, 6), ...body } };
    });
    await show(revisionOf(texts, 3));
    await type("Capacitance", "53.6");
    const conflict = await screen.findByLabelText("Two versions of this draft", {}, { timeout: 3000 });
    const rows = within(conflict)
      .getAllByRole("row")
      .map(({ textContent }) => textContent);
    expect(rows).toEqual(expect.arrayContaining(["Impedance74.975", "Capacitance6753.6"]));
    fireEvent.click(within(conflict).getByText("Keep mine, on top of theirs", { selector: "button" }));
    await rest(0);
    expect(field("Impedance").value).toBe("74.9");
    expect(field("Capacitance").value).toBe("53.6");
    await waitFor(() => expect(sent.at(-1)?.ifMatch).toBe('"5"'), { timeout: 3000 });
    expect(sent.at(-1)?.body.inputs).toMatchObject({ nominal: { z0Ohm: 74.9 } });
  });

  test("whose field cannot be read is not sent, and the text stays with its sentence", async () => {
    const sent = serve(() => uses);
    await show(revisionOf(texts, 3));
    await type("Impedance", "seventy");
    expect(screen.getByText(/“seventy” is not a resistance/)).toBeTruthy();
    expect(button("Send for review").getAttribute("aria-disabled")).toBe("true");
    await rest(1200);
    expect(sent).toEqual([]);
    expect(window.localStorage.length).toBe(1);
  });

  test("is sent for review with what waits saved first", async () => {
    const sent = serve(({ method }) => (method === "GET" ? uses : { status: 200, body: revisionOf(texts, 4) }));
    await show(revisionOf(texts, 3));
    await type("What it is", "a trunk");
    fireEvent.click(button("Send for review"));
    const dialog = screen.getByText(/Send C75-F9 for review/).closest("dialog")!;
    expect(within(dialog).getByText(/contradicts itself/)).toBeTruthy();
    fireEvent.click(within(dialog).getByText("Send it", { selector: "button" }));
    await waitFor(() => expect(router.push).toHaveBeenCalledWith("/cables/c75-f9"));
    expect(sent.map(({ method, path }) => `${method} ${path}`)).toEqual([
      "PATCH /cables/c75-f9",
      "POST /cables/c75-f9/submit",
    ]);
  });
});

test("A draft opened and left alone is never sent", async () => {
  const revision = revisionOf(texts, 3);
  const sent = serve(() => uses);
  await show({ ...revision, inputs: null });
  await rest(1100);
  expect(sent).toEqual([]);
  expect(draftOf(revision).designation).toBe("C75-F9");
});
