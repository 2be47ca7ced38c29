import type { Metadata, Route } from "next";
import { found } from "@/app/(work)/found";
import { LetterList } from "@/components/notices/letter-list";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { listLetters } from "@/lib/mail/letters/service";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Letters" };

export default async function LettersPage() {
  const actor = await currentActor();
  const first = found(() => listLetters(actor));
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/team/letters" title="Letters" back={"/notices" as Route} />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <LetterList first={first} />
      </main>
    </>
  );
}
