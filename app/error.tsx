"use client";

import { useEffect } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { Wordmark } from "@/components/ui/mark";
import { StateGlyph } from "@/components/ui/state-mark";

interface ErrorPageProps {
  error: Error & { digest?: string };
  reset: () => void;
}

/** A fault of ours. What was saved is safe; the number finds the fault in the server's own record. */
export default function ErrorPage({ error, reset }: ErrorPageProps) {
  useEffect(() => {
    console.error(error);
  }, [error]);
  return (
    <main id="main" className="page-margin pt-7">
      <Wordmark />
      <h1 className="mt-16 flex items-center gap-3">
        <StateGlyph state="fail" size={20} />
        This page could not be drawn
      </h1>
      <p className="mt-2 max-w-lg text-ink-2">
        The fault is ours, not yours. What you had saved is still there. Try again; if it stays, tell your admin
        {error.digest ? (
          <>
            {" "}
            the number <span className="figures text-ink">{error.digest}</span>.
          </>
        ) : (
          " what you were doing."
        )}
      </p>
      <div className="mt-4 flex gap-2.5">
        <Button kind="main" onClick={reset}>
          Try again
        </Button>
        <ButtonLink href="/runs">To the runs</ButtonLink>
      </div>
    </main>
  );
}
