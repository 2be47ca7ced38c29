import type { Metadata } from "next";
import { CalculatePage, type CalculatePageProps } from "@/app/(work)/calculate/calculate-page";
import { AttenuationCalculator } from "@/components/calculators/attenuation";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { attenuationInputs } from "@/lib/calculators/attenuation";
import { openCalculator } from "@/lib/calculators/service";

export const metadata: Metadata = { title: "Attenuation of a length" };

export default async function AttenuationPage({ searchParams }: CalculatePageProps) {
  const actor = await currentActor();
  const opened = openCalculator(actor, attenuationInputs, await searchParams);
  return (
    <CalculatePage actor={actor} title="Attenuation of a length">
      <AttenuationCalculator
        key={JSON.stringify(opened.texts)}
        opened={opened}
        canStartRun={may(actor, "runs.write")}
      />
    </CalculatePage>
  );
}
