"use client";

import type { Route } from "next";
import Link from "next/link";
import { usePathname, useRouter } from "next/navigation";
import { useEffect, type ReactNode } from "react";
import { MovedOn } from "@/components/runs/moved-on";
import { useRunEditor } from "@/components/runs/run-editor";
import { Conflict, SavingNote } from "@/components/runs/saving-note";
import { Button, ButtonLink } from "@/components/ui/button";
import { useKeys } from "@/components/ui/keys";
import { ViewTabs } from "@/components/ui/view-tabs";

interface Props {
  /** right of the title: the readings of the view */
  head: ReactNode;
  children: ReactNode;
}

/** Title, views and saving state of a run; the view itself inside. */
export function RunFrame({ head, children }: Props) {
  const { saved, draft, undo, redo, canEdit } = useRunEditor();
  const path = usePathname();
  const base = `/runs/${saved.id}`;
  const views = [
    { href: base as Route, label: "Line" },
    { href: `${base}/match` as Route, label: "Match" },
    { href: `${base}/time` as Route, label: "Time" },
    { href: `${base}/tolerance` as Route, label: "Tolerance" },
  ];
  useRunKeys(base, undo, redo);
  return (
    <>
      <div className="flex min-h-14.5 items-start gap-8 folded:flex-col folded:gap-2">
        <div className="w-128 min-w-0 folded:w-full">
          <p className="truncate text-label text-ink-3 phone:hidden">
            <Link href="/runs" className="hover:text-copper">
              Runs
            </Link>{" "}
            / {[saved.number, draft.site, draft.folder].filter(Boolean).join(" / ")}
          </p>
          {canEdit ? <NameField /> : <h1 className="truncate">{draft.name}</h1>}
        </div>
        {head}
      </div>
      <div className="mt-3">
        <ViewTabs
          items={views}
          current={path}
          name="Views of this run"
          aside={
            <>
              <SavingNote />
              {canEdit && (
                <>
                  <Button size="small" onClick={() => undo?.()} refused={!undo && "There is nothing to undo."}>
                    Undo
                  </Button>
                  <Button size="small" onClick={() => redo?.()} refused={!redo && "There is nothing to redo."}>
                    Redo
                  </Button>
                </>
              )}
              {path === base && (
                <ButtonLink href={`${base}/match` as Route} kind="main" size="small" className="phone:hidden">
                  Compare matches
                </ButtonLink>
              )}
            </>
          }
        />
      </div>
      <Conflict />
      <MovedOn runId={saved.id} />
      {children}
    </>
  );
}

/** The title, which is edited where it stands. */
function NameField() {
  const { draft, edit, faults, setFault } = useRunEditor();
  const fault = faults["name"];
  function take(text: string) {
    const isEmpty = text.trim() === "";
    setFault("name", isEmpty ? { text, message: "Give the run a name." } : null);
    if (!isEmpty) edit({ ...draft, name: text }, "name");
  }
  return (
    <>
      <h1>
        <input
          aria-label="Name of the run"
          aria-invalid={fault ? true : undefined}
          value={fault?.text ?? draft.name}
          maxLength={120}
          onChange={(event) => take(event.target.value)}
          className={`-mx-1 w-full truncate border-b bg-transparent px-1 hover:border-rule phone:text-figure ${fault ? "border-fail" : "border-transparent"}`}
        />
      </h1>
      {fault && <p className="text-note text-fail">{fault.message}</p>}
    </>
  );
}

/** Keys of a run wherever one stands in it; undo works inside fields too, as everywhere. */
function useRunKeys(base: string, undo: (() => void) | null, redo: (() => void) | null) {
  const router = useRouter();
  useKeys([
    { key: "1", does: "line", run: () => router.push(base as Route) },
    { key: "2", does: "match", run: () => router.push(`${base}/match` as Route) },
    { key: "3", does: "time", run: () => router.push(`${base}/time` as Route) },
    { key: "4", does: "tolerance", run: () => router.push(`${base}/tolerance` as Route) },
    { key: "Ctrl z", does: "undo; with Shift, redo" },
  ]);
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== "z") return;
      const act = event.shiftKey ? redo : undo;
      if (!act) return;
      event.preventDefault();
      act();
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [undo, redo]);
}
