import type { Route } from "next";
import Link from "next/link";
import { CalculatorKeys } from "@/components/calculators/calculator-keys";
import { Vignette } from "@/components/calculators/vignettes";
import { KeyCap } from "@/components/ui/key-cap";
import { calculatorPlaces } from "@/lib/calculators/places";

interface Props {
  /** whether the reader may see the limit lines */
  hasLimits: boolean;
}

/** The calculators, each drawn and in a sentence. */
export function CalculatorIndex({ hasLimits }: Props) {
  return (
    <>
      <CalculatorKeys />
      <h1 className="phone:sr-only">Calculate</h1>
      <p className="mt-1 max-w-160 text-ink-2">
        Figures without a run. What stands on a page is in its address, so it can be sent as it is; cables come from
        your catalogue or are typed, and each page leads on into a run.
      </p>
      <ul className="mt-5 grid grid-cols-3 gap-x-10 gap-y-8 folded:grid-cols-2 phone:grid-cols-1">
        {calculatorPlaces.map(({ path, title, answers }, i) => (
          <li key={path} className="border-t-[1.5px] border-ink pt-2">
            <Link href={path as Route} className="group block">
              <div className="flex items-baseline justify-between gap-3">
                <h2 className="group-hover:text-copper">{title}</h2>
                <span className="phone:hidden">
                  <KeyCap>{i + 1}</KeyCap>
                </span>
              </div>
              <div className="mt-3">
                <Vignette path={path} />
              </div>
              <p className="mt-2 text-label text-ink-2">{answers}</p>
            </Link>
          </li>
        ))}
      </ul>
      {hasLimits && (
        <p className="mt-8 border-t border-line pt-3 text-label">
          <Link href={"/limits" as Route} className="link">
            Limit lines
          </Link>{" "}
          of the standards and of your team: what a cable, link or channel may lose, reflect and delay.
        </p>
      )}
    </>
  );
}
