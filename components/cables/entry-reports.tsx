"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import type { CableReport, Settlement } from "@/lib/cables/reports/schema";
import { call } from "@/lib/http/call";

interface Props {
  cableId: string;
  reports: readonly CableReport[];
  mayReport: boolean;
  maySettle: boolean;
}

const area =
  "mt-0.5 block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-body text-ink phone:text-section";

const outcomeWords: Record<Settlement["outcome"], string> = {
  ...{ quarantined: "Quarantined", corrected: "Corrected", noFault: "No fault found" },
};
const settleWords: [Settlement["outcome"], string][] = [
  ["quarantined", "Quarantine it"],
  ["corrected", "Corrected"],
  ["noFault", "No fault"],
];

/** Sends something about an entry and shows the page as it then stands. */
function useSending(path: string, done: () => void) {
  const router = useRouter();
  return useMutation({
    mutationFn: (body: unknown) => call<CableReport>(path, { method: "POST", body }),
    onSuccess: () => (done(), router.refresh()),
  });
}

function Settle({ report }: { report: CableReport }) {
  const [answer, setAnswer] = useState("");
  const path = `/cables/${encodeURIComponent(report.cableId)}/reports/${report.id}/settle`;
  const settle = useSending(path, () => setAnswer(""));
  const refused = settle.isPending ? "It is on its way." : answer.trim() === "" && "Say first what came of it.";
  return (
    <div className="mt-1.5">
      <label className="block text-note text-ink-2">
        What came of it
        <textarea
          value={answer}
          maxLength={2000}
          rows={2}
          onChange={(e) => setAnswer(e.target.value)}
          className={area}
        />
      </label>
      <div className="mt-1.5 flex flex-wrap gap-2">
        {settleWords.map(([outcome, label]) => (
          <Button key={outcome} size="small" refused={refused} onClick={() => settle.mutate({ outcome, answer })}>
            {label}
          </Button>
        ))}
      </div>
      {settle.error && <StateNote state="fail">{settle.error.message}</StateNote>}
    </div>
  );
}

function Report({ report, maySettle }: { report: CableReport; maySettle: boolean }) {
  const { personName, reportedAt, text, outcome, settledByName, answer } = report;
  return (
    <li className="border-b border-line py-1.25">
      <span className="text-ink-2">
        {personName}, {reportedAt.slice(0, 10)}
      </span>
      <p className="break-words">{text}</p>
      {outcome ? (
        <p className="text-ink-2">
          {outcomeWords[outcome]} by {settledByName}: {answer}
        </p>
      ) : (
        maySettle && <Settle report={report} />
      )}
    </li>
  );
}

function NewReport({ cableId }: { cableId: string }) {
  const [isOpen, setOpen] = useState(false);
  const [text, setText] = useState("");
  const send = useSending(`/cables/${encodeURIComponent(cableId)}/reports`, () => (setText(""), setOpen(false)));
  if (!isOpen)
    return (
      <Button size="small" className="mt-2" onClick={() => setOpen(true)}>
        Report a problem with this cable
      </Button>
    );
  const refused = send.isPending ? "It is on its way." : text.trim() === "" && "Say first what is wrong.";
  return (
    <div className="mt-2">
      <label className="block text-note text-ink-2">
        What is wrong with it
        <textarea value={text} maxLength={2000} rows={3} onChange={(e) => setText(e.target.value)} className={area} />
      </label>
      <div className="mt-1.5 flex flex-wrap gap-2">
        <Button size="small" kind="main" refused={refused} onClick={() => send.mutate({ text })}>
          Report it
        </Button>
        <Button size="small" onClick={() => setOpen(false)}>
          Leave it
        </Button>
      </div>
      {send.error && <StateNote state="fail">{send.error.message} Your words are still in the field.</StateNote>}
    </div>
  );
}

/** Problems that people have reported, and a place to report one. */
export function EntryReports({ cableId, reports, mayReport, maySettle }: Props) {
  if (reports.length === 0 && !mayReport) return null;
  return (
    <Section title={reports.length === 0 ? "No problem reported" : "Problems reported"} rule="light">
      <ul className="text-label">
        {reports.map((report) => (
          <Report key={report.id} report={report} maySettle={maySettle} />
        ))}
      </ul>
      {mayReport && <NewReport cableId={cableId} />}
    </Section>
  );
}
