"use client";

import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { FileDrop } from "@/components/ui/file-drop";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import type { Evidence, EvidenceList as Listed } from "@/lib/cables/evidence/schema";
import { AwayError, ProblemError } from "@/lib/http/call";
import { sendForm } from "@/lib/http/upload";

const kinds: Record<Evidence["mediaType"], string> = {
  "application/pdf": "PDF",
  "image/png": "PNG",
  "image/jpeg": "JPEG",
  "image/webp": "WebP",
  "application/touchstone": "Touchstone",
  "text/csv": "CSV",
};

/** "340 kB", "2.1 MB" */
export function sizeWords(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  return bytes < 1_000_000 ? `${Math.round(bytes / 1000)} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`;
}

function AddEvidence({ path, onAdded }: { path: string; onAdded: () => void }) {
  const [title, setTitle] = useState("");
  const [file, setFile] = useState<File>();
  const [isSending, setSending] = useState(false);
  const [trouble, setTrouble] = useState<{ detail: string; title?: string }>();
  async function add(event: FormEvent) {
    event.preventDefault();
    if (!file || isSending) return;
    const form = new FormData();
    form.set("title", title);
    form.set("file", file);
    setSending(true);
    setTrouble(undefined);
    try {
      await sendForm<Evidence>(`${path}/evidence`, form);
      setTitle("");
      setFile(undefined);
      onAdded();
    } catch (error) {
      if (!(error instanceof ProblemError || error instanceof AwayError)) throw error;
      const errors = error instanceof ProblemError ? error.problem.errors : undefined;
      setTrouble({ detail: error.message, title: errors?.find((each) => each.path === "title")?.message });
    } finally {
      setSending(false);
    }
  }
  return (
    <details className="mt-2 text-label">
      <summary className="link cursor-pointer phone:min-h-11">Add a file</summary>
      <form onSubmit={add} className="mt-2 flex flex-col gap-2.5">
        <Field
          label="Title, issue and page"
          value={title}
          error={trouble?.title}
          onChange={(event) => setTitle(event.target.value)}
        />
        <FileDrop
          label={file ? `${file.name}, ${sizeWords(file.size)}` : "or drop it here"}
          hint="PDF, CSV, Touchstone, PNG, JPEG or WebP, at most 25 MB. What it is, is told by its content."
          accept=".pdf,.csv,.png,.jpg,.jpeg,.webp,.s1p,.s2p,.s3p,.s4p,.ts"
          onFile={setFile}
        />
        {trouble && !trouble.title && (
          <div role="alert">
            <StateNote state="fail">{trouble.detail}</StateNote>
          </div>
        )}
        <Button type="submit" size="small" className="self-start" refused={!file && "Choose a file first."}>
          {isSending ? "Sending …" : "Add"}
        </Button>
      </form>
    </details>
  );
}

interface Props {
  /** of the entry in the API */
  path: string;
  evidence: Listed;
  onAdded: () => void;
}

/** The files that bear out an entry's figures. */
export function EvidenceList({ path, evidence: { items, mayAdd }, onAdded }: Props) {
  return (
    <Section title="Evidence">
      {items.length === 0 && <p className="text-label text-ink-3">No file bears these figures out yet.</p>}
      <ul className="text-label">
        {items.map(({ id, title, fileName, mediaType, sizeBytes, revision, addedByName, addedAt }) => {
          const address = `/api/v1${path}/evidence/${id}`;
          return (
            <li key={id} className="border-b border-line py-1.25">
              <span className="block break-words">{title}</span>
              <span className="flex flex-wrap gap-x-3">
                <a href={address} download={fileName} className="link break-all">
                  {fileName}
                </a>
                {mediaType.startsWith("image/") && (
                  <a href={`${address}?view=true`} target="_blank" rel="noopener" className="link">
                    Look at it
                  </a>
                )}
              </span>
              <span className="block text-note text-ink-3">
                {kinds[mediaType]}, {sizeWords(sizeBytes)}, revision {revision}, {addedByName}, {addedAt.slice(0, 10)}
              </span>
            </li>
          );
        })}
      </ul>
      {mayAdd && <AddEvidence path={path} onAdded={onAdded} />}
    </Section>
  );
}
