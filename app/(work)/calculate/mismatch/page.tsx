import type { Metadata } from "next";
import { CalculatePage, type CalculatePageProps } from "@/app/(work)/calculate/calculate-page";
import { MismatchCalculator } from "@/components/calculators/mismatch";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { mismatchInputs } from "@/lib/calculators/mismatch";
import { openCalculator } from "@/lib/calculators/service";

export const metadata: Metadata = { title: "Mismatch and power" };

export default async function MismatchPage({ searchParams }: CalculatePageProps) {
  const actor = await currentActor();
  const opened = openCalculator(actor, mismatchInputs, await searchParams);
  return (
    <CalculatePage actor={actor} title="Mismatch and power">
      <MismatchCalculator key={JSON.stringify(opened.texts)} opened={opened} canStartRun={may(actor, "runs.write")} />
    </CalculatePage>
  );
}
