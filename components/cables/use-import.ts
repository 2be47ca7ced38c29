"use client";

import { useRef, useState } from "react";
import { AwayError, ProblemError } from "@/lib/http/call";
import { sendFile } from "@/lib/http/upload";
import type { ImportReport } from "@/lib/cables/imports/schema";
import type { Family } from "@/lib/cables/schema";

interface Progress {
  done: number;
  of: number;
}

export type ImportStage =
  | { at: "start" }
  | { at: "reading" | "bringing in"; progress?: Progress }
  | { at: "read" | "brought in"; report: ImportReport };

const isJson = (file: File) => /\.json$/i.test(file.name) || file.type === "application/json";

/** A file on its way into the catalogue: read as a dry run, then, if wanted, brought in. */
export function useImport() {
  const [stage, setStage] = useState<ImportStage>({ at: "start" });
  const [file, setFile] = useState<File>();
  const [trouble, setTrouble] = useState<string>();
  const running = useRef<AbortController>(undefined);

  async function send(chosen: File, family: Family | "", isDryRun: boolean) {
    const query = new URLSearchParams({ dryRun: String(isDryRun), fileName: chosen.name.slice(-200) });
    if (family) query.set("family", family);
    const before: ImportStage = isDryRun ? { at: "start" } : stage;
    const control = new AbortController();
    running.current?.abort();
    running.current = control;
    const at = isDryRun ? "reading" : "bringing in";
    setTrouble(undefined);
    setStage({ at });
    try {
      const sent = { body: chosen, mediaType: isJson(chosen) ? "application/json" : "text/csv" };
      const told = (progress: Progress) => setStage({ at, progress });
      const report = await sendFile<Progress, ImportReport>(`/cables/import?${query}`, sent, told, control.signal);
      setStage({ at: isDryRun ? "read" : "brought in", report });
    } catch (error) {
      if (control.signal.aborted) return;
      setStage(before);
      if (!(error instanceof ProblemError || error instanceof AwayError)) throw error;
      setTrouble(error.message);
    }
  }

  return {
    ...{ stage, file, trouble },
    read: (chosen: File, family: Family | "") => {
      setFile(chosen);
      return send(chosen, family, true);
    },
    bringIn: (family: Family | "") => file && send(file, family, false),
    stop: () => {
      running.current?.abort();
      setStage({ at: "start" });
    },
  };
}
