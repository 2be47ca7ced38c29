import type { ReactNode } from "react";
import { GlobalKeys } from "@/components/team/global-keys";
import { QueryProvider } from "@/components/team/query-provider";
import { KeysProvider } from "@/components/ui/keys";

/** Pages for those who are signed in. Each page asks who that is: a layout is not run again on every visit. */
export default function WorkLayout({ children }: { children: ReactNode }) {
  return (
    <QueryProvider>
      <KeysProvider>
        <GlobalKeys />
        {children}
      </KeysProvider>
    </QueryProvider>
  );
}
