import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { NewRunForm } from "@/components/runs/new-run-form";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { listUsableCables } from "@/lib/cables/service";
import { readRunStart } from "@/lib/runs/start";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Start a run" };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function NewRunPage({ searchParams }: Props) {
  const actor = await currentActor();
  if (!may(actor, "runs.write")) notFound();
  const start = readRunStart(await searchParams);
  const cables = listUsableCables(actor).map(({ id, designation, name, condition }) => ({
    id,
    designation,
    name,
    condition,
  }));
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/runs" title="Start a run" back="/runs" />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <NewRunForm cables={cables} start={start} />
      </main>
    </>
  );
}
