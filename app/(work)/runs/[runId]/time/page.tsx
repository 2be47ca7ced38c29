import type { Metadata } from "next";
import { TimeView } from "@/components/runs/time-view";

export const metadata: Metadata = { title: "Time" };

export default function RunTimePage() {
  return <TimeView />;
}
