import type { Metadata } from "next";
import { MatchView } from "@/components/runs/match-view";

export const metadata: Metadata = { title: "Match" };

export default function RunMatchPage() {
  return <MatchView />;
}
