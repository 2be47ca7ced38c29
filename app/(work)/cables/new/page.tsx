import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { LazyEditor } from "@/components/cables/editor/lazy-editor";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "New cable" };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function NewCablePage({ searchParams }: Props) {
  const actor = await currentActor();
  if (!may(actor, "cables.propose")) notFound();
  const { designation } = await searchParams;
  const brought = typeof designation === "string" ? designation.slice(0, 40) : "";
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/cables" title="New cable" back="/cables" />
      <main id="main" className="page-margin pt-2.5 pb-20">
        <LazyEditor revision={null} designation={brought} person={{ id: actor.personId, name: actor.name }} />
      </main>
    </>
  );
}
