"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";

/** Puts the page's address on the clipboard: everything that stands on the page is in it. */
export function CopyAddress() {
  const [said, setSaid] = useState("");
  async function copy() {
    try {
      await navigator.clipboard.writeText(window.location.href);
      setSaid("Copied");
    } catch {
      // Without a secure page or a permission there is no clipboard; the address bar has the same text.
      setSaid("Copy it from the address bar");
    }
  }
  return (
    <>
      <span role="status" className={said ? "" : "sr-only"}>
        {said}
      </span>
      <Button size="small" onClick={() => void copy()} title="Everything on this page is in its address">
        Copy the address
      </Button>
    </>
  );
}
