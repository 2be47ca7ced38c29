import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import type { ReactNode } from "react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { ago } from "@/components/review/ago";
import { ChangedFields } from "@/components/review/changed-fields";
import { EffectOnRuns } from "@/components/review/effect-on-runs";
import { stateSentence } from "@/components/review/effect-words";
import { fieldWords } from "@/components/review/field-words";
import { lossDifference } from "@/components/review/loss-difference";
import { QueueList } from "@/components/review/queue-list";
import { RadialProfile } from "@/components/review/radial-profile";
import { Review, type Reviewed } from "@/components/review/review";
import { KeysProvider } from "@/components/ui/keys";
import { differences } from "@/lib/cables/revisions/differences";
import type { ReviewQueue } from "@/lib/cables/queue/schema";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import type { Build, Construction } from "@/lib/cables/schema";
import { modelFromNominal } from "@/lib/line/cable";
import type { CableUses, Effect, RunEffect } from "@/lib/runs/effects/schema";

const push = vi.fn();
vi.mock("next/navigation", () => ({ useRouter: () => ({ push, refresh: vi.fn() }) }));

const build: Build = {
  ...{ conductor: "2.70 mm solid copper", isStranded: false, dielectric: "foam", dielectricName: "PE" },
  ...{ screen: ["foil", "braid"], screenName: "foil and braid", jacket: "PE", pairCount: 1 },
};
const coax = (dielectricMm: number): Construction => ({
  ...{ kind: "coax", innerMm: 2, dielectricMm, relativePermittivity: 1.45, lossTangent: 1e-4, outerDiameterMm: 8 },
});
const conductors = (r0OhmPerM: number) => [{ form: "sqrt" as const, r0OhmPerM, skinCornerRadPerS: 2e5 }];

const revision = (change: Partial<CableRevision>): CableRevision => ({
  ...{ id: "plover", designation: "PLOVER", aliases: [], name: "Trunk", family: "coaxial", state: "approved" },
  ...{ condition: null, preferred: false, revision: 2, construction: coax(5.05), build, figures: [], limits: {} },
  ...{ successor: null, version: 4, isCurrent: true, reason: "First.", authorId: "a", authorName: "Ada Okoro" },
  ...{ createdAt: "2026-05-01T08:00:00.000Z", submittedAt: null, approvedByName: null, approvedAt: null },
  ...{
    inputs: null,
    checks: [],
    model: modelFromNominal({ z0: 75, velocityFactor: 0.83, conductors: conductors(0.03) }),
  },
  ...change,
});
const before = revision({ approvedAt: "2026-05-14T08:00:00.000Z" });
const after = revision({
  ...{
    revision: 3,
    version: 9,
    state: "inReview",
    isCurrent: false,
    construction: coax(5.19),
    reason: "Cut four samples.",
  },
  model: modelFromNominal({ z0: 75, velocityFactor: 0.83, conductors: conductors(0.0315) }),
  submittedAt: "2026-11-29T10:00:00.000Z",
});
const reviewed: Reviewed = { before, after, refusals: { approve: null, return: null } };

const queue: ReviewQueue = {
  waiting: [
    {
      ...{ cableId: "plover", designation: "PLOVER", revision: 3, family: "coaxial", construction: coax(5.19), build },
      ...{ outerDiameterMm: 8, authorName: "Ada Okoro", submittedAt: "2026-11-29T10:00:00.000Z" },
      ...{ changedFields: 1, refusal: null },
    },
  ],
  ...{ waitingTotal: 1, settled: [], due: [], reports: [] },
};

const effect = (change: Partial<Effect>): Effect => ({
  ...{ quantity: "loss", plane: null, bandHz: [1e6, 2e6], atLeast: null, atMost: 4.6, changePercent: -3, why: null },
  ...{ now: { value: 4.45, frequencyHz: 2e6, isMet: true }, then: { value: 4.31, frequencyHz: 2e6, isMet: true } },
  ...change,
});
const run = (change: Partial<RunEffect> = {}): RunEffect => ({
  ...{ runId: "r", number: "R1", name: "Slipway camera", state: "issued", ownerName: "Owen", revisions: [2] },
  ...{ isAffected: false, effects: [effect({})], changesState: false, largestPercent: -3, why: null },
  ...change,
});
const uses: CableUses = { cableId: "plover", designation: "PLOVER", revision: 3, total: 1, items: [run()] };

interface Sent {
  path: string;
  method: string;
  body: unknown;
  ifMatch: string | null;
}
const sent: Sent[] = [];
let refusal: { status: number; detail: string } | null = null;

beforeEach(() => {
  sent.length = 0;
  refusal = null;
  push.mockClear();
  vi.stubGlobal("matchMedia", () => ({ matches: true, addEventListener: () => {}, removeEventListener: () => {} }));
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function () {
    this.open = false;
  };
  vi.stubGlobal("fetch", async (path: string, { method = "GET", body, headers }: RequestInit = {}) => {
    if (path.includes("/uses")) return Response.json(uses);
    if (path.endsWith("/comments") && method === "GET") return Response.json({ items: [] });
    const ifMatch = new Headers(headers).get("if-match");
    sent.push({ path, method, body: typeof body === "string" ? JSON.parse(body) : undefined, ifMatch });
    return refusal ? Response.json({ title: "No", ...refusal }, { status: refusal.status }) : Response.json(after);
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(children: ReactNode) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  return render(
    <QueryClientProvider client={client}>
      <KeysProvider>{children}</KeysProvider>
    </QueryClientProvider>,
  );
}
const page = (change: Partial<Reviewed> = {}) => (
  <Review queue={queue} reviewed={{ ...reviewed, ...change }} canDecide now="2026-12-01T10:00:00.000Z" />
);
const approveButton = () => screen.getByRole("button", { name: /Approve revision 3/ });

describe("The queue", () => {
  test("says how many wait and for how long, and marks the one that is shown", () => {
    show(page());
    expect(screen.getByText(/1 waiting, oldest 2 days\. You cannot review your own changes\./)).toBeTruthy();
    const link = within(screen.getByRole("list", { name: "Waiting for a reviewer" })).getByRole("link");
    expect(link.getAttribute("aria-current")).toBe("true");
    expect(link.textContent).toContain("Revision 3, 1 field");
  });

  test("that is empty says so, and where drafts are", () => {
    const nothing = { ...queue, waiting: [], waitingTotal: 0 };
    show(<Review queue={nothing} reviewed={null} canDecide now="2026-12-01T10:00:00.000Z" />);
    expect(screen.getByText(/Nothing is waiting for a reviewer/)).toBeTruthy();
    expect(screen.getByRole("link", { name: "Drafts in the catalogue" })).toBeTruthy();
  });

  test("lists what is due and what was reported", () => {
    const due = [
      { cableId: "x", designation: "X", revision: 1, reviewDueAt: "2026-11-01T00:00:00.000Z", isOverdue: true },
    ];
    render(<QueueList queue={{ ...queue, due }} shown={null} now="2026-12-01T10:00:00.000Z" />);
    expect(screen.getByText(/overdue since 2026-11-01/)).toBeTruthy();
  });
});

describe("The fields that changed", () => {
  test("stand with the old value struck and the new one marked, and the others on request", () => {
    render(<ChangedFields before={before} after={after} lossAtHz={100e6} />);
    const row = screen.getByRole("row", { name: /Dielectric diameter/ });
    expect(row.querySelector("s")?.textContent).toContain("5.05");
    expect(row.querySelector("b")?.textContent).toContain("5.19");
    expect(row.textContent).toContain("+2.8 %");
    expect(screen.queryByRole("row", { name: /Outer diameter/ })).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: /fields that did not change/ }));
    expect(screen.getByRole("row", { name: /Outer diameter/ })).toBeTruthy();
  });

  test("have names of the trade and units, conductors in words", () => {
    const words = differences(before, after).map((each) => fieldWords(each, 100e6));
    expect(words.find(({ name }) => name === "Model: conductors")?.after).toMatch(
      /^sqrt 31\.50 mΩ\/m, corner 31\.83 kHz$/,
    );
    expect(words.every(({ name }) => !/[a-z][A-Z]/.test(name))).toBe(true);
  });
});

test("The profile from the centre outwards says which layer moved and by how much all round", () => {
  const drawn = (each: CableRevision) => ({ ...each, outerDiameterMm: 8 });
  render(<RadialProfile before={{ revision: 2, cable: drawn(before) }} after={{ revision: 3, cable: drawn(after) }} />);
  expect(screen.getByRole("img").getAttribute("aria-label")).toContain("dielectric grows by 0.070 mm all round");
});

test("The difference in loss is the ratio of the models: 5 % more resistance is nearly 5 % more conductor loss", () => {
  const percent = lossDifference(before, after);
  for (const value of percent) expect(value).toBeGreaterThan(4.5);
  for (const value of percent) expect(value).toBeLessThan(5.01);
  expect(lossDifference(before, before).every((value) => value === 0)).toBe(true);
});

describe("What it does to runs", () => {
  test("tells each run now and then, and that no target changes state", async () => {
    show(<EffectOnRuns cableId="plover" revision={3} />);
    const row = await screen.findByRole("row", { name: /R1 Slipway camera/ });
    expect(row.textContent).toContain("4.45");
    expect(row.textContent).toContain("4.31");
    expect(row.textContent).toContain("uses revision 2");
    expect(screen.getByText(/No target changes state/)).toBeTruthy();
  });

  test.each([
    ["fail", true, false, /One target that is met would be missed/],
    ["pass", false, true, /One target that is missed would be met/],
    ["pass", false, false, /No target changes state/],
  ] as const)("%s: a target from %s to %s", (state, now, then, text) => {
    const judged = effect({
      now: { value: 1, frequencyHz: 1, isMet: now },
      then: { value: 2, frequencyHz: 1, isMet: then },
    });
    expect(stateSentence([run({ effects: [judged] })])).toEqual({ state, text: expect.stringMatching(text) });
  });

  test("what cannot be worked out is no pass", () => {
    expect(stateSentence([run({ effects: [], why: "It cannot be worked out." })])).toMatchObject({ state: "warn" });
  });
});

describe("Deciding", () => {
  test("by the key A approves, against the version that is shown", async () => {
    show(page());
    fireEvent.keyDown(document.body, { key: "a" });
    await vi.waitFor(() => expect(push).toHaveBeenCalledWith("/review"));
    expect(sent).toEqual([
      { path: "/api/v1/cables/plover/approve", method: "POST", body: { note: "", answers: {} }, ifMatch: '"9"' },
    ]);
  });

  test("is refused in words to who wrote it, by button and by key", () => {
    show(page({ refusals: { approve: "You cannot review your own changes.", return: "You cannot." } }));
    expect(approveButton().getAttribute("aria-disabled")).toBe("true");
    fireEvent.keyDown(document.body, { key: "a" });
    fireEvent.click(approveButton());
    expect(sent).toEqual([]);
  });

  test("waits for an answer to what the checks ask, and sends it", async () => {
    const checks = [
      { check: "triangle", verdict: "look" as const, sentence: "Impedance and velocity are 4.0 % apart." },
    ];
    show(page({ after: { ...after, checks } }));
    expect(approveButton().getAttribute("aria-disabled")).toBe("true");
    fireEvent.change(screen.getByLabelText("What you make of it"), { target: { value: "The sheet rounds." } });
    fireEvent.click(screen.getByLabelText("Source opened and read"));
    fireEvent.click(approveButton());
    await vi.waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]?.body).toEqual({
      ...{ note: "Looked at: source opened and read.", answers: { triangle: "The sheet rounds." } },
    });
  });

  test("is not possible for what contradicts itself, whatever is answered", () => {
    const checks = [{ check: "triangle", verdict: "contradiction" as const, sentence: "They are 25.0 % apart." }];
    show(page({ after: { ...after, checks } }));
    expect(approveButton().getAttribute("aria-disabled")).toBe("true");
    expect(screen.getAllByText(/They are 25\.0 % apart/).length).toBeGreaterThan(0);
  });

  test("by the key R asks what has to change, and returns with it", async () => {
    show(page());
    fireEvent.keyDown(document.body, { key: "r" });
    const dialog = screen.getByRole("dialog", { name: /Return revision 3/ });
    expect(within(dialog).getByRole("button", { name: "Return it" }).getAttribute("aria-disabled")).toBe("true");
    fireEvent.change(within(dialog).getByLabelText("What has to change"), { target: { value: "Name the source." } });
    fireEvent.click(within(dialog).getByRole("button", { name: "Return it" }));
    await vi.waitFor(() =>
      expect(sent[0]).toMatchObject({ path: "/api/v1/cables/plover/return", body: { note: "Name the source." } }),
    );
  });

  test("on what changed a second ago says so and offers to show it", async () => {
    refusal = { status: 412, detail: "Revision 3 of PLOVER was changed meanwhile." };
    show(page());
    fireEvent.click(approveButton());
    expect(await screen.findByText(/was changed meanwhile/)).toBeTruthy();
    expect(screen.getByRole("button", { name: "Show it as it now stands" })).toBeTruthy();
    expect(push).not.toHaveBeenCalled();
  });

  test("names the restriction that carries over, and lifts it when asked", async () => {
    show(page({ before: { ...before, condition: "Up to 1 GHz." } }));
    expect(screen.getByText(/The restriction carries over: Up to 1 GHz\./)).toBeTruthy();
    fireEvent.click(screen.getByLabelText("Lift it with this approval"));
    fireEvent.click(approveButton());
    await vi.waitFor(() => expect(sent[0]?.body).toMatchObject({ condition: null }));
  });

  test("is not offered to an auditor", () => {
    show(<Review queue={queue} reviewed={reviewed} canDecide={false} now="2026-12-01T10:00:00.000Z" />);
    expect(screen.queryByRole("button", { name: /Approve/ })).toBeNull();
    expect(screen.getByText(/your role decides nothing/)).toBeTruthy();
  });
});

test.each([
  ["2026-12-01T09:59:30.000Z", "just now"],
  ["2026-12-01T09:58:00.000Z", "2 minutes"],
  ["2026-12-01T05:00:00.000Z", "5 hours"],
  ["2026-11-30T09:00:00.000Z", "1 day"],
])("%s is %s ago", (at, words) => {
  expect(ago(at, "2026-12-01T10:00:00.000Z")).toBe(words);
});
