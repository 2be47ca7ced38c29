import type { Metadata, Route } from "next";
import { found } from "@/app/(work)/found";
import { LimitList } from "@/components/limits/limit-list";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { listLimitLines } from "@/lib/limit-lines/service";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Limit lines" };

export default async function LimitsPage() {
  const actor = await currentActor();
  const lines = found(() => listLimitLines(actor));
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/calculate" title="Limit lines" back={"/calculate" as Route} />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <LimitList first={lines} canWrite={may(actor, "limits.write")} />
      </main>
    </>
  );
}
