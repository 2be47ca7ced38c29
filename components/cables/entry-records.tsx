"use client";

import { useQuery, useQueryClient } from "@tanstack/react-query";
import { EvidenceList } from "@/components/cables/evidence-list";
import { LotList } from "@/components/cables/lot-list";
import { Button } from "@/components/ui/button";
import { StateNote } from "@/components/ui/state-mark";
import type { EvidenceList as Evidence } from "@/lib/cables/evidence/schema";
import type { LotList as Lots } from "@/lib/cables/lots/schema";
import type { Cable } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

/** What is kept beside an entry's values: the files that bear them out, the lots that were measured. */
export function EntryRecords({ cable }: { cable: Cable }) {
  const client = useQueryClient();
  const path = `/cables/${encodeURIComponent(cable.id)}`;
  const key = ["cable", cable.id, "records"];
  const records = useQuery({
    queryKey: key,
    queryFn: async ({ signal }) => {
      const [evidence, lots] = await Promise.all([
        call<Evidence>(`${path}/evidence`, { signal }),
        call<Lots>(`${path}/lots`, { signal }),
      ]);
      return { evidence, lots };
    },
  });
  const reload = () => client.invalidateQueries({ queryKey: key });
  if (records.error)
    return (
      <div role="alert" className="flex flex-wrap items-center gap-3">
        <StateNote state="fail">Evidence and lots could not be fetched. {records.error.message}</StateNote>
        <Button size="small" onClick={() => void records.refetch()}>
          Try again
        </Button>
      </div>
    );
  if (!records.data) return null;
  return (
    <>
      <EvidenceList path={path} evidence={records.data.evidence} onAdded={reload} />
      <LotList path={path} cable={cable} lots={records.data.lots} onAdded={reload} />
    </>
  );
}
