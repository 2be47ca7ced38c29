import type { Route } from "next";
import type { ReactNode } from "react";
import { WorkBar } from "@/components/team/work-bar";
import type { Actor } from "@/lib/auth/actor";
import { describeActor } from "@/lib/team/service";

export interface CalculatePageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

interface Props {
  actor: Actor;
  title: string;
  children: ReactNode;
}

/** The bar and the margins around a calculator. */
export function CalculatePage({ actor, title, children }: Props) {
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/calculate" title={title} back={"/calculate" as Route} />
      <main id="main" className="page-margin pt-3.5 pb-20">
        {children}
      </main>
    </>
  );
}
