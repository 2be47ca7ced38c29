"use client";

import { useRouter } from "next/navigation";
import { useKeys } from "@/components/ui/keys";
import { toggleTheme } from "@/components/ui/theme";

/** Keys that work on every page. */
export function GlobalKeys() {
  const router = useRouter();
  function find() {
    const field = document.querySelector<HTMLInputElement>("input[type=search]");
    if (field) field.focus();
    else router.push("/cables");
  }
  useKeys([
    { key: "/", does: "find a cable", run: find },
    { key: "t", does: "change paper or tar", run: toggleTheme },
  ]);
  return null;
}
