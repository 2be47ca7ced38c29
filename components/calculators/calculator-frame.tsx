"use client";

import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";
import { useCalculatorKeys } from "@/components/calculators/calculator-keys";
import { CopyAddress } from "@/components/calculators/copy-address";
import type { Calculator } from "@/components/calculators/use-calculator";
import { ButtonLink } from "@/components/ui/button";
import { StateNote } from "@/components/ui/state-mark";
import { ViewTabs } from "@/components/ui/view-tabs";
import { calculatorPlaces, type CalculatorPath } from "@/lib/calculators/places";

interface Props {
  path: CalculatorPath;
  calculator: Pick<Calculator, "notes">;
  /** right of the title */
  head: ReactNode;
  /** where a run begins with what stands here; null for those who may not start one */
  start: string | null;
  children: ReactNode;
}

const tabs = calculatorPlaces.map(({ path, label }) => ({ href: path as Route, label }));

/** Title, the calculators side by side, the ways on, and what of the address could not be used. */
export function CalculatorFrame({ path, calculator, head, start, children }: Props) {
  useCalculatorKeys();
  const title = calculatorPlaces.find((place) => place.path === path)?.title;
  return (
    <>
      <div className="flex min-h-14.5 items-start gap-8 folded:flex-col folded:gap-2">
        <div className="w-110 min-w-0 folded:w-full phone:sr-only">
          <p className="text-label text-ink-3">
            <Link href={"/calculate" as Route} className="hover:text-copper">
              Calculate
            </Link>{" "}
            /
          </p>
          <h1>{title}</h1>
        </div>
        {head}
      </div>
      <div className="mt-3">
        <ViewTabs
          items={tabs}
          current={path}
          name="Calculators"
          isFootOnPhone={false}
          aside={
            <>
              <CopyAddress />
              {start !== null && (
                <ButtonLink href={start as Route} kind="main" size="small">
                  Start a run with this
                </ButtonLink>
              )}
            </>
          }
        />
      </div>
      {calculator.notes.map((note) => (
        <StateNote key={note} state="warn" className="mt-2">
          {note}
        </StateNote>
      ))}
      {children}
    </>
  );
}

interface ResultsProps {
  calculator: Pick<Calculator, "problems">;
  children: ReactNode;
}

/** The results; while something is wrong with a field, those of the last values that gave any, and it is said. */
export function Results({ calculator, children }: ResultsProps) {
  const isBehind = Object.keys(calculator.problems).length > 0;
  return (
    <>
      {isBehind && (
        <p role="status" className="mt-3 text-label text-ink-2">
          Until every field is right, the figures are those of the last values that were.
        </p>
      )}
      <div className={`mt-4 ${isBehind ? "opacity-60" : ""}`}>{children}</div>
    </>
  );
}
