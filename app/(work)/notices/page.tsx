import type { Metadata, Route } from "next";
import Link from "next/link";
import { NoticeList } from "@/components/notices/notice-list";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { listNotices } from "@/lib/notices/inbox/service";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Notices" };

export default async function NoticesPage() {
  const actor = await currentActor();
  const letters = (
    <Link href={"/team/letters" as Route} className="link">
      Letters of the team
    </Link>
  );
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/notices" title="Notices" />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <NoticeList first={listNotices(actor)} aside={may(actor, "team.readLetters") && letters} />
      </main>
    </>
  );
}
