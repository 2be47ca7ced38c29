import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { readLot } from "@/components/cables/add-lot";
import { CatalogueFiles } from "@/components/cables/catalogue-files";
import { EvidenceList } from "@/components/cables/evidence-list";
import { ImportReport } from "@/components/cables/import-report";
import { ImportView } from "@/components/cables/import-view";
import { LotList } from "@/components/cables/lot-list";
import { modelFromNominal } from "@/lib/line/cable";
import type { ImportReport as Report, ImportRow } from "@/lib/cables/imports/schema";
import type { Cable } from "@/lib/cables/schema";

// jsdom knows no media; motion is not wanted here.
beforeEach(() => vi.stubGlobal("matchMedia", () => ({ matches: true })));
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const row = (change: Partial<ImportRow>): ImportRow => ({
  ...{ row: 2, designation: "QA-50", outcome: "draft", faults: [], notes: [], cableId: null },
  figures: { z0Ohm: 50, velocityFactor: 0.85, lossDbPer100m: 14.2 },
  ...change,
});
const report = (change: Partial<Report> = {}): Report => ({
  ...{ importId: null, fileName: "old.csv", rowCount: 2, notes: ["Decimals are parted by a comma."] },
  columns: [
    { head: "Cap.", readAs: "capacitance, pF/m" },
    { head: "Price", readAs: null },
  ],
  counts: { draft: 1, quarantined: 1, unchanged: 0, duplicate: 0, noEntry: 0 },
  rows: [row({}), row({ row: 3, designation: "QA-75", outcome: "quarantined", faults: ["They are 25 % apart."] })],
  ...change,
});

describe("The report of an import", () => {
  test("says of every row what becomes of it and why, and which columns were not read", () => {
    render(<ImportReport report={report()} />);
    const line = screen.getByRole("row", { name: /QA-75/ });
    expect(within(line).getAllByText("Quarantined").length).toBeGreaterThan(0);
    expect(within(line).getAllByText("They are 25 % apart.").length).toBeGreaterThan(0);
    expect(screen.getByText(/1 of 2 columns are read; not “Price”/)).toBeTruthy();
    expect(screen.getByText("Decimals are parted by a comma.")).toBeTruthy();
  });

  test("shows one kind of rows alone, and all again", () => {
    render(<ImportReport report={report()} />);
    const only = screen.getByRole("button", { name: /Quarantined/ });
    fireEvent.click(only);
    expect([only.getAttribute("aria-pressed"), screen.queryByRole("row", { name: /QA-50/ })]).toEqual(["true", null]);
    fireEvent.click(only);
    expect(screen.getByRole("row", { name: /QA-50/ })).toBeTruthy();
  });

  test("of thousands of rows draws a hundred, and more on demand", () => {
    const rows = Array.from({ length: 5_000 }, (_, i) => row({ row: i + 2, designation: `G-${i}` }));
    render(<ImportReport report={report({ rows, rowCount: 5_000 })} />);
    expect(screen.getAllByRole("row")).toHaveLength(101);
    fireEvent.click(screen.getByRole("button", { name: "Show more" }));
    expect(screen.getAllByRole("row")).toHaveLength(201);
  });

  test("leads to the entries that came of it", () => {
    render(<ImportReport report={report({ rows: [row({ cableId: "a b" })] })} />);
    expect(screen.getByRole("link", { name: "QA-50" }).getAttribute("href")).toBe("/cables/a%20b");
  });
});

describe("Bringing in", () => {
  const answers = (...lines: unknown[]) =>
    new Response(lines.map((line) => `${JSON.stringify(line)}\n`).join(""), {
      headers: { "Content-Type": "application/x-ndjson" },
    });
  const choose = (name: string) =>
    fireEvent.change(screen.getByLabelText("Choose a file"), { target: { files: [new File(["Type,Z0"], name)] } });

  test("reads first and stores nothing, then brings in the same file", async () => {
    const asked: string[] = [];
    vi.stubGlobal("fetch", async (address: string) => {
      asked.push(address);
      return answers({ progress: { done: 1, of: 2 } }, { report: report() });
    });
    render(<ImportView />);
    choose("old.csv");
    const button = await screen.findByRole("button", { name: "Bring in 1 draft and 1 in quarantine" });
    expect(screen.getByText("Nothing is stored yet.")).toBeTruthy();
    fireEvent.click(button);
    expect(await screen.findByText(/Brought in: 1 draft and 1 in quarantine/)).toBeTruthy();
    expect(asked).toEqual([
      "/api/v1/cables/import?dryRun=true&fileName=old.csv",
      "/api/v1/cables/import?dryRun=false&fileName=old.csv",
    ]);
  });

  test("says in the server's words why a file is refused, before it is read or while it is", async () => {
    const detail = "The file is a workbook or another zip file; save the sheet as CSV.";
    vi.stubGlobal("fetch", async () => answers({ problem: { title: "x", status: 422, detail } }));
    render(<ImportView />);
    choose("old.xlsx");
    expect(await screen.findByText(detail)).toBeTruthy();
    vi.stubGlobal(
      "fetch",
      async () => new Response(JSON.stringify({ title: "x", status: 413, detail: "Too long." }), { status: 413 }),
    );
    choose("old.csv");
    await waitFor(() => expect(screen.getByText("Too long.")).toBeTruthy());
  });

  test("has nothing to bring in where no row is an entry, and says so", async () => {
    const none = report({ counts: { draft: 0, quarantined: 0, unchanged: 2, duplicate: 0, noEntry: 0 } });
    vi.stubGlobal("fetch", async () => answers({ report: none }));
    render(<ImportView />);
    choose("old.csv");
    const button = await screen.findByRole("button", { name: /Bring in 0/ });
    expect(button.getAttribute("aria-disabled")).toBe("true");
  });

  test("an answer that is cut off counts as none", async () => {
    vi.stubGlobal("fetch", async () => answers({ progress: { done: 1, of: 2 } }));
    render(<ImportView />);
    choose("old.csv");
    expect(await screen.findByText("Ropewalk cannot be reached.")).toBeTruthy();
  });
});

describe("Taking out", () => {
  test("is offered to whoever may, bringing in to whoever may", () => {
    const { rerender, container } = render(<CatalogueFiles canExport canImport={false} />);
    expect(screen.getByText("All cables as CSV").getAttribute("href")).toBe("/api/v1/cables/export?format=csv");
    expect(screen.queryByText("Bring in cables")).toBeNull();
    rerender(<CatalogueFiles canExport canImport />);
    expect(screen.getByText("Bring in cables")).toBeTruthy();
    rerender(<CatalogueFiles canExport={false} canImport={false} />);
    expect(container.textContent).toBe("");
  });
});

describe("What is kept beside an entry", () => {
  const file = {
    ...{ id: "e1", revision: 2, fileName: "sheet.pdf", mediaType: "application/pdf" as const, sizeBytes: 340_000 },
    ...{ hash: "0", title: "A sheet, issue 2", addedByName: "Libby", addedAt: "2026-02-03T10:00:00.000Z" },
  };

  test("its files can be kept; only pictures are offered to look at", () => {
    const items = [file, { ...file, id: "e2", fileName: "cut.png", mediaType: "image/png" as const }];
    render(<EvidenceList path="/cables/x" evidence={{ items, mayAdd: false }} onAdded={() => undefined} />);
    expect(screen.getByRole("link", { name: "sheet.pdf" }).getAttribute("href")).toBe("/api/v1/cables/x/evidence/e1");
    expect(screen.getAllByRole("link", { name: "Look at it" })).toHaveLength(1);
    expect(screen.getByText(/^PDF, 340 kB, revision 2, Libby, 2026-02-03$/)).toBeTruthy();
    expect(screen.queryByText("Add a file")).toBeNull();
  });

  test("its lots stand against the model", () => {
    const cable = { model: modelFromNominal({ z0: 50, velocityFactor: 0.85 }) } as Cable;
    const figure = {
      quantity: "velocityFactor",
      valueSi: 0.843,
      asTyped: "0.843",
      kind: "measured" as const,
      source: "x",
    };
    const lot = {
      ...{ id: "l", lot: "Q-114", reel: "", lengthM: 20, figures: [figure], note: "", measuredAt: "2026-02-10" },
      ...{ addedByName: "Libby", addedAt: "2026-02-10T10:00:00.000Z", model: null },
    };
    render(<LotList path="/x" cable={cable} lots={{ items: [lot], mayAdd: false }} onAdded={() => undefined} />);
    expect(screen.getByText("Q-114")).toBeTruthy();
    expect(screen.getByText("0.843")).toBeTruthy();
    // 0.843 against 0.85: 0.8 % less.
    expect(screen.getByText(/0\.8 %/).textContent).toMatch(/^[−-]0\.8.%$/);
  });

  test("a lot is read in the units people type, and each fault stands at its field", () => {
    const read = readLot({
      lot: "Q-114",
      velocityFactor: "84.3 %",
      loopResistanceOhmPerM: "8.9 Ω/km",
      lengthM: "65.6168 ft",
    });
    expect(read).toEqual({
      body: { lot: "Q-114", velocityFactor: 0.843, loopResistanceOhmPerM: 0.0089, lengthM: expect.closeTo(20, 5) },
    });
    expect(readLot({ lot: "Q", z0Ohm: "fifty" })).toEqual({ wrong: { z0Ohm: expect.stringContaining("fifty") } });
  });
});
