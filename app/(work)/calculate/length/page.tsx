import type { Metadata } from "next";
import { CalculatePage, type CalculatePageProps } from "@/app/(work)/calculate/calculate-page";
import { LengthCalculator } from "@/components/calculators/length";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { lengthInputs } from "@/lib/calculators/length";
import { openCalculator } from "@/lib/calculators/service";

export const metadata: Metadata = { title: "Electrical and cut length" };

export default async function LengthPage({ searchParams }: CalculatePageProps) {
  const actor = await currentActor();
  const opened = openCalculator(actor, lengthInputs, await searchParams);
  return (
    <CalculatePage actor={actor} title="Electrical and cut length">
      <LengthCalculator key={JSON.stringify(opened.texts)} opened={opened} canStartRun={may(actor, "runs.write")} />
    </CalculatePage>
  );
}
