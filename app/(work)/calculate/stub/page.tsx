import type { Metadata } from "next";
import { CalculatePage, type CalculatePageProps } from "@/app/(work)/calculate/calculate-page";
import { StubCalculator } from "@/components/calculators/stub";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { stubInputs } from "@/lib/calculators/stub";
import { openCalculator } from "@/lib/calculators/service";

export const metadata: Metadata = { title: "Stub and section" };

export default async function StubPage({ searchParams }: CalculatePageProps) {
  const actor = await currentActor();
  const opened = openCalculator(actor, stubInputs, await searchParams);
  return (
    <CalculatePage actor={actor} title="Stub and section">
      <StubCalculator key={JSON.stringify(opened.texts)} opened={opened} canStartRun={may(actor, "runs.write")} />
    </CalculatePage>
  );
}
