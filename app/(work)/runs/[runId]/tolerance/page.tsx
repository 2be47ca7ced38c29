import type { Metadata } from "next";
import { ToleranceView } from "@/components/runs/tolerance-view";

export const metadata: Metadata = { title: "Tolerance" };

export default function RunTolerancePage() {
  return <ToleranceView />;
}
