import type { Metadata } from "next";
import { RunList } from "@/components/runs/run-list";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { listRuns } from "@/lib/runs/list/service";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Runs" };

export default async function RunsPage() {
  const actor = await currentActor();
  const page = listRuns(actor);
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/runs" title="Runs" />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <RunList personId={actor.personId} first={page} canStart={may(actor, "runs.write")} />
      </main>
    </>
  );
}
