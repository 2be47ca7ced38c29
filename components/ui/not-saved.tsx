"use client";

import { Button } from "@/components/ui/button";
import { StateMark } from "@/components/ui/state-mark";

interface NotSavedProps {
  since: Date;
  message: string;
  retry: () => void;
}

const clock = (date: Date) => date.toLocaleTimeString(undefined, { hour: "2-digit", minute: "2-digit" });

/** Trouble with saving: since when, why, and another try. */
export function NotSaved({ since, message, retry }: NotSavedProps) {
  return (
    <span role="status" className="flex flex-wrap items-center gap-2">
      <StateMark state="fail">Not saved since {clock(since)}</StateMark>
      <span>{message}</span>
      <Button size="small" onClick={retry}>
        Try again
      </Button>
    </span>
  );
}
