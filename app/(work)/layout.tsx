import type { ReactNode } from "react";
import { QueryProvider } from "@/components/team/query-provider";

/** Pages for those who are signed in. Each page asks who that is: a layout is not run again on every visit. */
export default function WorkLayout({ children }: { children: ReactNode }) {
  return <QueryProvider>{children}</QueryProvider>;
}
