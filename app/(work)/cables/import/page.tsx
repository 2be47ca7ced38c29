import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ImportView } from "@/components/cables/import-view";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Bring in cables" };

export default async function ImportPage() {
  const actor = await currentActor();
  if (!may(actor, "cables.import")) notFound();
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/cables" title="Bring in cables" back="/cables" />
      <main id="main" className="page-margin pt-2.5 pb-20">
        <ImportView />
      </main>
    </>
  );
}
