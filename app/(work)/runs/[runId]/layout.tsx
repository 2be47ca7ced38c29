import type { ReactNode } from "react";
import { CursorProvider } from "@/components/plot/cursor";
import { RunEditorProvider } from "@/components/runs/run-editor";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { openRun } from "@/lib/runs/open/service";
import { describeActor } from "@/lib/team/service";
import { found } from "@/app/(work)/found";

interface Props {
  params: Promise<{ runId: string }>;
  children: ReactNode;
}

/** The run being worked on stays while its views come and go. */
export default async function RunLayout({ params, children }: Props) {
  const actor = await currentActor();
  const { runId } = await params;
  const { run, lines, cannotEditBecause, people } = found(() => openRun(actor, runId));
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/runs" title={run.name} back="/runs" hasOwnFoot />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <RunEditorProvider
          key={`${run.id}`}
          run={run}
          lines={lines}
          cannotEditBecause={cannotEditBecause}
          people={people}
        >
          <CursorProvider>{children}</CursorProvider>
        </RunEditorProvider>
      </main>
    </>
  );
}
