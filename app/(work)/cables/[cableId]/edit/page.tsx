import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { found } from "@/app/(work)/found";
import { BeginRevision } from "@/components/cables/editor/begin-revision";
import { LazyEditor } from "@/components/cables/editor/lazy-editor";
import { NotEditable } from "@/components/cables/editor/not-editable";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { findOpenNumber, getCurrentRevision, getRevision } from "@/lib/cables/revisions/service";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Edit a cable" };

interface Props {
  params: Promise<{ cableId: string }>;
}

export default async function EditCablePage({ params }: Props) {
  const actor = await currentActor();
  if (!may(actor, "cables.propose")) notFound();
  const cableId = decodeURIComponent((await params).cableId);
  const open = found(() => findOpenNumber(actor, cableId));
  const revision = found(() =>
    open === undefined ? getCurrentRevision(actor, cableId) : getRevision(actor, cableId, open),
  );
  const { designation, state, authorId, authorName } = revision;
  const isEditor = authorId === actor.personId || may(actor, "cables.review");
  const because =
    state === "inReview"
      ? "It is in review and no longer changes unless it is returned."
      : !isEditor && `It is ${authorName}’s draft; it is changed by its author, a librarian or an admin.`;
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/cables" title={designation} back="/cables" />
      <main id="main" className="page-margin pt-2.5 pb-20">
        {open === undefined ? (
          <BeginRevision cableId={cableId} designation={designation} revision={revision.revision} />
        ) : because ? (
          <NotEditable cableId={cableId} designation={designation} revision={open} because={because} />
        ) : (
          <LazyEditor
            key={`${cableId} ${open}`}
            revision={revision}
            person={{ id: actor.personId, name: actor.name }}
          />
        )}
      </main>
    </>
  );
}
