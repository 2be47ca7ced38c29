import type { Metadata } from "next";
import { found } from "@/app/(work)/found";
import { Review } from "@/components/review/review";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { getQueue, getReviewed } from "@/lib/cables/queue/service";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Review" };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function ReviewPage({ searchParams }: Props) {
  const actor = await currentActor();
  const { cable } = await searchParams;
  const queue = found(() => getQueue(actor));
  const [first] = queue.waiting;
  const asked = typeof cable === "string" ? cable : first?.cableId;
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/review" title="Review" />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <Review
          queue={queue}
          reviewed={asked === undefined ? null : getReviewed(actor, asked)}
          canDecide={may(actor, "cables.review")}
          now={new Date().toISOString()}
        />
      </main>
    </>
  );
}
