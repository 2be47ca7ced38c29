import type { Metadata, Route } from "next";
import { redirect } from "next/navigation";
import { LaidBand } from "@/app/sign-in/laid-band";
import { nextPath } from "@/app/sign-in/next-path";
import { SignIn } from "@/app/sign-in/sign-in";
import { ThemeSwitch } from "@/components/ui/theme-switch";
import { findCurrentActor } from "@/lib/auth/actor";
import { demoPassword, demoSignIns } from "@/lib/team/demo";

export const metadata: Metadata = { title: "Sign in" };

/** The front door. */
export default async function SignInPage({ searchParams }: PageProps<"/sign-in">) {
  const next = nextPath((await searchParams).next);
  if (await findCurrentActor()) redirect(next as Route);
  return (
    <div className="flex min-h-dvh flex-col overflow-x-clip">
      <main
        id="main"
        className="mx-auto w-full max-w-[1440px] flex-1 px-21 pt-21 folded:px-7 folded:pt-10 phone:px-4 phone:pt-6"
      >
        <SignIn next={next} people={demoSignIns()} password={demoPassword()} />
      </main>
      <LaidBand />
      <footer className="mx-auto flex w-full max-w-[1440px] justify-end px-21 py-3 folded:px-7 phone:px-4">
        <ThemeSwitch />
      </footer>
    </div>
  );
}
