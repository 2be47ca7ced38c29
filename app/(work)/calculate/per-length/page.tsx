import type { Metadata } from "next";
import { CalculatePage, type CalculatePageProps } from "@/app/(work)/calculate/calculate-page";
import { PerLengthCalculator } from "@/components/calculators/per-length";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { perLengthInputs } from "@/lib/calculators/per-length";
import { openCalculator } from "@/lib/calculators/service";

export const metadata: Metadata = { title: "Per-length figures" };

export default async function PerLengthPage({ searchParams }: CalculatePageProps) {
  const actor = await currentActor();
  const opened = openCalculator(actor, perLengthInputs, await searchParams);
  return (
    <CalculatePage actor={actor} title="Per-length figures">
      <PerLengthCalculator key={JSON.stringify(opened.texts)} opened={opened} canStartRun={may(actor, "runs.write")} />
    </CalculatePage>
  );
}
