import type { Metadata } from "next";
import { LineView } from "@/components/runs/line-view";

export const metadata: Metadata = { title: "Line" };

export default function RunLinePage() {
  return <LineView />;
}
