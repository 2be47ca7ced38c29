/** What each step with an entry is called, asks for and is followed by. */
import type { PossibleStep } from "@/lib/cables/possible-steps";
import type { CableEvent } from "@/lib/cables/events/schema";

export interface AskedField {
  name: string;
  label: string;
  kind: "text" | "line" | "date" | "cable" | "run" | "equivalence";
  isNeeded: boolean;
}

export interface StepWords {
  /** on the button */
  label: string;
  /** the question of the dialog */
  title: (designation: string) => string;
  /** what follows */
  after: string;
  confirm: string;
  fields: AskedField[];
}

const text = (label: string, isNeeded = true, name = "note"): AskedField => ({ name, label, kind: "text", isNeeded });

export const stepWords: Record<PossibleStep, StepWords> = {
  revise: {
    label: "New revision",
    title: (designation) => `Begin a new revision of ${designation}`,
    after: "It starts as your draft with today’s values. Runs keep the revision they use.",
    confirm: "Begin it",
    fields: [text("Why", true, "reason")],
  },
  submit: {
    label: "Send for review",
    title: (designation) => `Send ${designation} for review`,
    after: "It no longer changes unless a reviewer returns it.",
    confirm: "Send it",
    fields: [text("What the reviewer should know", false)],
  },
  takeBack: {
    label: "Take the draft back",
    title: (designation) => `Take back the draft of ${designation}`,
    after: "The draft is gone for good. An entry that was never approved goes with it.",
    confirm: "Take it back",
    fields: [],
  },
  prefer: {
    label: "Prefer",
    title: (designation) => `Mark ${designation} as preferred`,
    after: "People are shown it before others of its kind.",
    confirm: "Prefer it",
    fields: [],
  },
  unprefer: {
    label: "No longer prefer",
    title: (designation) => `Take the preferred mark from ${designation}`,
    after: "It stays approved.",
    confirm: "Take the mark away",
    fields: [],
  },
  restrict: {
    label: "Restrict",
    title: (designation) => `Restrict ${designation}`,
    after: "It may go into runs under this condition only. Owners of runs that use it are told.",
    confirm: "Restrict it",
    fields: [text("Condition", true, "condition"), text("Why", false)],
  },
  quarantine: {
    label: "Quarantine",
    title: (designation) => `Quarantine ${designation}`,
    after: "It goes into no new run. Runs that use it stay readable, and their owners are told.",
    confirm: "Quarantine it",
    fields: [text("What is wrong with it")],
  },
  release: {
    label: "Release",
    title: (designation) => `Release ${designation}`,
    after: "It may be used again; what was never approved becomes its author’s draft.",
    confirm: "Release it",
    fields: [text("Why it may be used again")],
  },
  supersede: {
    label: "Supersede",
    title: (designation) => `Name what takes the place of ${designation}`,
    after: "It goes into no new run. Owners of runs that use it are told of its successor.",
    confirm: "Supersede it",
    fields: [
      { name: "successorId", label: "Successor", kind: "cable", isNeeded: true },
      { name: "equivalence", label: "How far it takes its place", kind: "equivalence", isNeeded: true },
      text("Why", false),
    ],
  },
  withdraw: {
    label: "Withdraw",
    title: (designation) => `Withdraw ${designation}`,
    after: "It is out of use for good. Runs that use it stay readable, and their owners are told.",
    confirm: "Withdraw it",
    fields: [text("Why")],
  },
  waive: {
    label: "Waiver for a run",
    title: (designation) => `Let one run have ${designation}`,
    after: "Only this run may have it, and only until that day.",
    confirm: "Give the waiver",
    fields: [
      { name: "runId", label: "Run", kind: "run", isNeeded: true },
      { name: "until", label: "Until, that day included", kind: "date", isNeeded: true },
      text("Why", true, "reason"),
    ],
  },
};

export const eventWords: Record<CableEvent["step"], string> = {
  ...{ begin: "begun", edit: "changed by another hand", submit: "sent for review", approve: "approved" },
  ...{ return: "returned", restrict: "restricted", quarantine: "quarantined", release: "released" },
  ...{ supersede: "superseded", withdraw: "withdrawn", prefer: "preferred", unprefer: "no longer preferred" },
};
