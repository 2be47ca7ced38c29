import type { Metadata } from "next";
import { found } from "@/app/(work)/found";
import { Entry } from "@/components/cables/entry";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { listEvents } from "@/lib/cables/events/service";
import { listReports } from "@/lib/cables/reports/service";
import { listRevisions } from "@/lib/cables/revisions/service";
import { getCable, listReferredCables } from "@/lib/cables/service";
import { getStanding } from "@/lib/cables/standing/service";
import { listWaivers } from "@/lib/cables/waivers/service";
import { listUses } from "@/lib/runs/uses/service";
import { describeActor } from "@/lib/team/service";

interface Props {
  params: Promise<{ cableId: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const actor = await currentActor();
  const { cableId } = await params;
  return { title: found(() => getCable(actor, decodeURIComponent(cableId))).designation };
}

export default async function CablePage({ params }: Props) {
  const actor = await currentActor();
  const cableId = decodeURIComponent((await params).cableId);
  const cable = found(() => getCable(actor, cableId));
  const [successor] = cable.successor ? listReferredCables(actor, [{ cableId: cable.successor.cableId }]) : [];
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/cables" title={cable.designation} back="/cables" />
      <main id="main" className="page-margin pt-2.5 pb-20">
        <Entry
          key={`${cable.id} ${cable.revision}`}
          cable={cable}
          successor={successor ?? null}
          revisions={listRevisions(actor, cableId)}
          events={listEvents(actor, cableId)}
          waivers={listWaivers(actor, cableId)}
          reports={listReports(actor, cableId)}
          standing={getStanding(actor, cableId)}
          uses={listUses(actor, cableId)}
          canStartRun={may(actor, "runs.write")}
        />
      </main>
    </>
  );
}
