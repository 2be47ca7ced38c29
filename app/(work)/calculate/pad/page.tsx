import type { Metadata } from "next";
import { CalculatePage, type CalculatePageProps } from "@/app/(work)/calculate/calculate-page";
import { PadCalculator } from "@/components/calculators/pad";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { padInputs } from "@/lib/calculators/pad";
import { openCalculator } from "@/lib/calculators/service";

export const metadata: Metadata = { title: "Resistive pad" };

export default async function PadPage({ searchParams }: CalculatePageProps) {
  const actor = await currentActor();
  const opened = openCalculator(actor, padInputs, await searchParams);
  return (
    <CalculatePage actor={actor} title="Resistive pad">
      <PadCalculator key={JSON.stringify(opened.texts)} opened={opened} canStartRun={may(actor, "runs.write")} />
    </CalculatePage>
  );
}
