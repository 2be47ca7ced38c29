"use client";

import { useQuery } from "@tanstack/react-query";
import type { Route } from "next";
import { useEffect } from "react";
import { NoticesLink } from "@/components/team/notices-link";
import { Bar } from "@/components/ui/bar";
import type { TabItem } from "@/components/ui/view-tabs";
import { call, ProblemError, speakFor } from "@/lib/http/call";
import { countHeld, forgetHeld } from "@/lib/runs/held";
import type { SignedIn } from "@/lib/team/schema";

interface Props {
  signedIn: SignedIn;
  current: "/cables" | "/runs" | "/calculate" | "/review" | "/notices" | "/team/letters";
  /** what a phone shows in place of the name */
  title: string;
  back?: Route;
  hasOwnFoot?: boolean;
}

const places: TabItem[] = [
  { href: "/cables", label: "Catalogue" },
  { href: "/runs", label: "Runs" },
  { href: "/calculate" as Route, label: "Calculate" },
];

/** Review is a place for those who review, and for those who may read it all. */
const reviewing: readonly SignedIn["role"][] = ["librarian", "admin"];
const readingReviews: readonly SignedIn["role"][] = [...reviewing, "auditor"];

/** The places of somebody's role, with how many revisions wait for a reviewer. */
function usePlaces({ role }: SignedIn): TabItem[] {
  const isReviewer = reviewing.includes(role);
  const { data } = useQuery({
    queryKey: ["review", "waiting"],
    queryFn: ({ signal }) => call<{ waiting: number }>("/review/waiting", { signal }),
    enabled: isReviewer,
  });
  if (!readingReviews.includes(role)) return places;
  return [...places, { href: "/review" as Route, label: "Review", count: data?.waiting }];
}

/** Ends the session and leaves nothing of the team's in the browser's memory: the door is loaded afresh. */
async function signOut(personId: string) {
  const unsent = countHeld(personId);
  const question = `Changes in ${unsent} of your runs and cables are not on the server yet. Sign out and lose them?`;
  if (unsent > 0 && !window.confirm(question)) return;
  try {
    await call("/session", { method: "DELETE" });
  } catch (error) {
    // A session that has ended by itself, or given way to somebody else's, is signed out already.
    if (!(error instanceof ProblemError && [401, 409].includes(error.problem.status))) throw error;
  }
  forgetHeld(personId);
  // A full load on purpose: nothing of the team stays in memory.
  // eslint-disable-next-line @next/next/no-location-assign-relative-destination
  window.location.assign("/sign-in");
}

export function WorkBar({ signedIn, current, title, back, hasOwnFoot }: Props) {
  useEffect(() => speakFor(signedIn.person.id), [signedIn.person.id]);
  return (
    <Bar
      places={usePlaces(signedIn)}
      current={current}
      home="/runs"
      teamName={signedIn.team.name}
      member={{ name: signedIn.person.name, email: signedIn.person.email, role: signedIn.role }}
      beside={<NoticesLink isCurrent={current === "/notices"} />}
      signOut={() => signOut(signedIn.person.id)}
      title={title}
      back={back}
      hasOwnFoot={hasOwnFoot}
    />
  );
}
