"use client";

import dynamic from "next/dynamic";
import { Agreement } from "@/components/cables/agreement";
import { Attenuation } from "@/components/cables/attenuation";
import { DimensionedSection } from "@/components/cables/dimensioned-section";
import { EntryConditions } from "@/components/cables/entry-conditions";
import { EntryHead } from "@/components/cables/entry-head";
import { EntryHistory } from "@/components/cables/entry-history";
import { EntryReadings } from "@/components/cables/entry-readings";
import { EntryReports } from "@/components/cables/entry-reports";
import { EntrySteps } from "@/components/cables/entry-steps";
import { PerMetre } from "@/components/cables/per-metre";
import { enlargementFor, sectionRoomPx } from "@/components/cables/section-parts";
import { Sources } from "@/components/cables/sources";
import { StripBack } from "@/components/cables/strip-back";
import { Tolerances } from "@/components/cables/tolerances";
import { useEntryAddress } from "@/components/cables/use-entry-address";
import { UsedIn } from "@/components/cables/used-in";
import { cableShape } from "@/components/line/cable-shape";
import { CursorProvider } from "@/components/plot/cursor";
import { StateNote } from "@/components/ui/state-mark";
import { outerDiameterMm } from "@/lib/cables/line";
import { lossTable, tableRange } from "@/lib/cables/loss-rows";
import type { CableEvent } from "@/lib/cables/events/schema";
import type { EntryStanding } from "@/lib/cables/possible-steps";
import type { CableReport } from "@/lib/cables/reports/schema";
import type { RevisionLine } from "@/lib/cables/revisions/schema";
import type { Cable } from "@/lib/cables/schema";
import type { Waiver } from "@/lib/cables/waivers/schema";
import { modelAt } from "@/lib/cables/warm-model";
import type { RunUse } from "@/lib/runs/uses/service";

// Fetched after the entry itself: what is kept beside it.
const EntryRecords = dynamic(() => import("@/components/cables/entry-records").then((file) => file.EntryRecords));

interface Props {
  cable: Cable;
  successor: Cable | null;
  revisions: readonly RevisionLine[];
  events: readonly CableEvent[];
  waivers: readonly Waiver[];
  reports: readonly CableReport[];
  standing: EntryStanding;
  uses: { total: number; items: readonly RunUse[] };
  canStartRun: boolean;
}

/** The cable end-on with its sizes, and with its layers laid bare. */
function Construction({ cable }: { cable: Cable }) {
  const { construction, build, family, designation } = cable;
  const drawn = { construction, build, family, outerDiameterMm: outerDiameterMm(construction) };
  const shape = cableShape(drawn);
  return (
    <section>
      <h2 className="text-body">
        Cross-section{" "}
        {shape && (
          <span className="font-[400] text-label text-ink-2 [font-variation-settings:normal]">
            scale {enlargementFor(shape.outerMm, sectionRoomPx).ratio} : 1 at 96 px to the inch, millimetres
          </span>
        )}
      </h2>
      <DimensionedSection {...drawn} />
      {shape && (
        <>
          <div className="mt-5">
            <StripBack designation={designation} {...drawn} />
          </div>
          <p className="text-note text-ink-3">
            Layers in order, thickness to scale. How much of each to strip depends on the plug; no plug is stored with
            the entry.
          </p>
        </>
      )}
    </section>
  );
}

/** An open draft is edited by its author or a reviewer; where none is open a new revision can be begun. */
function editWords({ current, open, hasOpen, mayPropose, mayReview }: EntryStanding): string | null {
  if (!mayPropose) return null;
  if (open) return open.state === "draft" && (open.isOwn || mayReview) ? `Edit revision ${open.revision}` : null;
  return !hasOpen && current.state !== "superseded" && current.state !== "withdrawn" ? "New revision" : null;
}

/** One cable, whole. Frequency, temperature and what is held stand in the address. */
export function Entry(props: Props) {
  const { cable, successor, revisions, events, waivers, reports, standing, uses, canStartRun } = props;
  const [asked, change] = useEntryAddress(cable.id);
  const warm = modelAt(cable.model, asked.temperatureC) ?? modelAt(cable.model, 20);
  const table = lossTable(cable.figures);
  const range = tableRange(table);
  const isBeyond = range === null || asked.lossAtHz < range[0] || asked.lossAtHz > range[1];
  if (!warm) return <StateNote state="fail">The model of this entry cannot be worked out.</StateNote>;
  const at = { table, model: warm.model, temperatureC: warm.temperatureC, lossAtHz: asked.lossAtHz };
  return (
    <CursorProvider>
      <EntryHead {...{ cable, successor, asked, change, canStartRun, edit: editWords(standing) }} />
      <EntryReadings cable={cable} warm={warm} lossAtHz={asked.lossAtHz} isBeyond={isBeyond} />
      <div className="mt-5 grid grid-cols-[380px_minmax(0,1fr)_342px] gap-x-10 gap-y-6 folded:grid-cols-[380px_minmax(0,1fr)] phone:grid-cols-1">
        <div className="flex min-w-0 flex-col gap-5">
          <Construction cable={cable} />
          <Tolerances cable={cable} />
        </div>
        <div className="flex min-w-0 flex-col gap-4">
          <EntryConditions cable={cable} warm={warm} asked={asked} change={change} />
          <Attenuation cable={cable} {...at} />
          <PerMetre {...at} />
          <EntrySteps cableId={cable.id} designation={cable.designation} standing={standing} />
          <EntryReports
            cableId={cable.id}
            reports={reports}
            mayReport={standing.mayReport}
            maySettle={standing.mayReview}
          />
        </div>
        <div className="flex min-w-0 flex-col gap-5 folded:col-start-2 phone:col-start-1">
          <Agreement cable={cable} />
          <Sources cable={cable} />
          <EntryRecords cable={cable} />
          <EntryHistory {...{ revisions, events, waivers }} current={cable.revision} />
          <UsedIn {...uses} />
        </div>
      </div>
    </CursorProvider>
  );
}
