import type { Metadata } from "next";
import { Catalogue } from "@/components/cables/catalogue";
import { WorkBar } from "@/components/team/work-bar";
import { currentActor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { readCatalogueAddress } from "@/lib/cables/address";
import { cableQuerySchema } from "@/lib/cables/query";
import { cableRequest, readRequest } from "@/lib/cables/request";
import { listCables } from "@/lib/cables/service";
import { parse } from "@/lib/http/parse";
import { describeActor } from "@/lib/team/service";

export const metadata: Metadata = { title: "Catalogue" };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function CataloguePage({ searchParams }: Props) {
  const actor = await currentActor();
  const request = cableRequest(readCatalogueAddress(await searchParams));
  const files = { canExport: may(actor, "cables.export"), canImport: may(actor, "cables.import") };
  const page = listCables(actor, parse(cableQuerySchema, readRequest(request)));
  return (
    <>
      <WorkBar signedIn={describeActor(actor)} current="/cables" title="Catalogue" />
      <main id="main" className="page-margin pt-2.5 pb-20">
        <Catalogue
          first={{ request, page }}
          canStartRun={may(actor, "runs.write")}
          canPropose={may(actor, "cables.propose")}
          files={files}
        />
      </main>
    </>
  );
}
