"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { DemoPeople } from "@/app/sign-in/demo-people";
import { SignInForm } from "@/app/sign-in/sign-in-form";
import { Wordmark } from "@/components/ui/mark";
import type { DemoSignIn } from "@/lib/team/demo";
import { signInSchema } from "@/lib/team/schema";

export type SignInFields = z.input<typeof signInSchema>;

interface SignInProps {
  /** a path of this site to go to */
  next: string;
  people: DemoSignIn[] | null;
  password: string | null;
}

/** What Ropewalk is for, the way in, and in the demo who is there. */
export function SignIn({ next, people, password }: SignInProps) {
  const form = useForm<SignInFields>({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: "", password: "" },
  });
  function fill(email: string) {
    form.clearErrors();
    form.reset({ email, password: password ?? "" });
    form.setFocus("password");
  }
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_400px] gap-x-12 pr-14 folded:grid-cols-1 folded:gap-y-8 folded:pr-0">
      <div>
        <Wordmark size="front" />
        <h1 className="mt-18 text-front tracking-[-0.02em] folded:mt-8 phone:mt-6 phone:text-title">
          Know the line before <br className="phone:hidden" />
          the reel is cut.
        </h1>
        <p className="mt-4 max-w-[500px] text-lead text-ink-2 phone:text-body">
          A shared catalogue of cables, and the runs you build from them: impedance, loss, echoes, matches and the sheet
          the installer signs.
        </p>
      </div>
      <SignInForm form={form} next={next} />
      {people && <DemoPeople people={people} password={password ?? ""} onChoose={fill} />}
    </div>
  );
}
