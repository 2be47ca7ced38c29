"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useKeys } from "@/components/ui/keys";
import { calculatorPlaces } from "@/lib/calculators/places";

/** The calculators on the keys 1 to 6, wherever one stands among them. */
export function useCalculatorKeys(): void {
  const router = useRouter();
  useKeys(
    calculatorPlaces.map(({ path, title }, i) => ({
      key: String(i + 1),
      does: title.toLowerCase(),
      run: () => router.push(path as Route),
    })),
  );
}

/** Adds the keys to a page that has nothing else to do in the browser. */
export function CalculatorKeys() {
  useCalculatorKeys();
  return null;
}
