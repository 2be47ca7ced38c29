/** What the entry's page offers to do, and what it says where that cannot be done. */
import { expect, test } from "vitest";
import { type EntryStanding, offeredSteps, type PossibleStep } from "@/lib/cables/possible-steps";
import { stepRequest } from "@/components/cables/step-request";

const approved: EntryStanding = {
  current: { revision: 2, version: 5, state: "approved", preferred: false },
  ...{ open: null, hasOpen: false, mayPropose: true, mayReview: true, mayReport: true },
};
const draft = { revision: 3, version: 7, state: "draft" as const, isOwn: true, wasSubmitted: false };
const names = (standing: EntryStanding) => offeredSteps(standing).map(({ step }) => step);
const refusal = (standing: EntryStanding, step: PossibleStep) =>
  offeredSteps(standing).find((each) => each.step === step)?.refusal;

test("A reader is offered nothing, a designer a new revision, a reviewer every step", () => {
  expect(names({ ...approved, mayPropose: false, mayReview: false })).toEqual([]);
  expect(names({ ...approved, mayReview: false })).toEqual(["revise"]);
  expect(names(approved)).toEqual(
    expect.arrayContaining(["prefer", "restrict", "quarantine", "release", "supersede", "withdraw", "waive"]),
  );
});

test("What cannot be done now says why", () => {
  expect(refusal(approved, "release")).toMatch(/^Only what is restricted or quarantined can be released/);
  expect(refusal(approved, "waive")).toMatch(/any run may have it/);
  expect(refusal({ ...approved, hasOpen: true }, "revise")).toMatch(/Somebody is working/);
  expect(refusal(approved, "quarantine")).toBeNull();
});

test("A draft of one's own can be sent, and taken back as long as it never was", () => {
  expect(names({ ...approved, open: draft, hasOpen: true }).slice(0, 2)).toEqual(["submit", "takeBack"]);
  expect(names({ ...approved, open: { ...draft, wasSubmitted: true }, hasOpen: true })).not.toContain("takeBack");
  expect(names({ ...approved, open: { ...draft, isOwn: false }, hasOpen: true })).not.toContain("submit");
});

test("A step is asked for with the version of the revision that it is taken with", () => {
  const standing = { ...approved, open: draft, hasOpen: true };
  expect(stepRequest("a b", "submit", standing, { note: " " })).toEqual({
    ...{ path: "/cables/a%20b/submit", method: "POST", body: {}, ifMatch: '"7"' },
  });
  expect(stepRequest("x", "restrict", standing, { condition: "Indoors." })).toMatchObject({
    ...{ path: "/cables/x/restrict", body: { condition: "Indoors." }, ifMatch: '"5"' },
  });
  expect(stepRequest("x", "unprefer", standing, {})).toMatchObject({
    path: "/cables/x/prefer",
    body: { preferred: false },
  });
  expect(stepRequest("x", "takeBack", standing, {})).toEqual({ path: "/cables/x", method: "DELETE" });
});
