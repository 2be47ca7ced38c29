import type { Metadata } from "next";
import { CalculatorIndex } from "@/components/calculators/calculator-index";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Calculate" };

export default async function CalculatePage() {
  const actor = await currentActor();
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/calculate" title="Calculate" />
      <main id="main" className="page-margin pt-3.5 pb-20">
        <CalculatorIndex hasLimits={may(actor, "cables.readCatalogue")} />
      </main>
    </>
  );
}
