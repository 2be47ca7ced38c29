"use client";

import Link from "next/link";
import { useState } from "react";
import { ImportReport } from "@/components/cables/import-report";
import { broughtIn } from "@/components/cables/import-words";
import { useImport } from "@/components/cables/use-import";
import { Button, ButtonLink } from "@/components/ui/button";
import { FileDrop } from "@/components/ui/file-drop";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { Working } from "@/components/ui/working";
import type { Family } from "@/lib/cables/schema";

const hint =
  "CSV or JSON of this catalogue, or a list of your own: the first row names the columns with their units. At most 25 MB and 20,000 rows.";

/** Bringing in many entries at once: the file is read, told row by row, and only then brought in. */
export function ImportView() {
  const [family, setFamily] = useState<Family | "">("");
  const { stage, file, trouble, read, bringIn, stop } = useImport();
  const isBusy = stage.at === "reading" || stage.at === "bringing in";
  const report = "report" in stage ? stage.report : undefined;
  const count = report ? report.counts.draft + report.counts.quarantined : 0;
  return (
    <div className="max-w-280">
      <p className="text-label text-ink-2 phone:hidden">
        <Link href="/cables" className="hover:text-copper">
          Catalogue
        </Link>
        {" / "}
      </p>
      <h1 className="phone:sr-only">Bring in cables</h1>
      <p className="mt-1 max-w-160 text-ink-2">
        Choosing a file stores nothing: you see first what each row was understood to be. Then they come in together, or
        none does: rows that contradict themselves go into quarantine, the others become your drafts.
      </p>
      <div className="mt-4 flex flex-wrap items-end gap-4">
        <Select
          label="Rows that name no family are"
          value={family}
          className="w-52"
          onChange={(event) => {
            const chosen = event.target.value as Family | "";
            setFamily(chosen);
            if (file && stage.at === "read") void read(file, chosen);
          }}
        >
          <option value="">not brought in</option>
          <option value="coaxial">coaxial</option>
          <option value="twistedPair">twisted pairs</option>
          <option value="twinaxial">twinaxial</option>
        </Select>
        <div className="min-w-72 flex-1">
          <FileDrop
            label="Drop a file here"
            hint={hint}
            accept=".csv,.tsv,.txt,.json,text/csv,application/json"
            onFile={(chosen) => void read(chosen, family)}
          />
        </div>
      </div>
      {trouble && (
        <div role="alert" className="mt-4">
          <StateNote state="fail">{trouble}</StateNote>
        </div>
      )}
      {isBusy && (
        <div className="mt-5">
          <Working
            label={stage.at === "reading" ? `Reading ${file?.name}` : "Bringing in"}
            done={stage.progress?.done}
            total={stage.progress?.of}
            onStop={stage.at === "reading" ? stop : undefined}
          />
        </div>
      )}
      {report && (
        <div className="mt-5 flex flex-wrap items-center gap-4" role="status">
          {stage.at === "read" ? (
            <>
              <Button
                kind="main"
                refused={count === 0 && "No row of the file would become an entry."}
                onClick={() => void bringIn(family)}
              >
                Bring in {broughtIn(report.counts)}
              </Button>
              <p className="text-label text-ink-2">Nothing is stored yet.</p>
            </>
          ) : (
            <>
              <StateNote state="pass">Brought in: {broughtIn(report.counts)}.</StateNote>
              <ButtonLink href="/cables?state=draft&state=quarantined">See them in the catalogue</ButtonLink>
            </>
          )}
        </div>
      )}
      {report && <ImportReport key={stage.at} report={report} />}
    </div>
  );
}
