"use client";

import { useState } from "react";
import { useFormState, type UseFormReturn } from "react-hook-form";
import type { SignInFields } from "@/app/sign-in/sign-in";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { StateNote } from "@/components/ui/state-mark";
import { AwayError, call, ProblemError } from "@/lib/http/call";

interface SignInFormProps {
  form: UseFormReturn<SignInFields>;
  /** a path of this site */
  next: string;
}

/** Why the door stayed shut, in one sentence. */
function refusal(error: unknown): string {
  if (error instanceof ProblemError) return error.problem.detail;
  if (error instanceof AwayError) return `${error.message} Try again when you are back on the network.`;
  return "That did not work. Try again in a moment.";
}

/** The password, with a switch to see it. */
function PasswordField({ form }: Pick<SignInFormProps, "form">) {
  const { errors } = useFormState({ control: form.control });
  const [isShown, setShown] = useState(false);
  const show = (
    <button
      type="button"
      aria-pressed={isShown}
      onClick={() => setShown(!isShown)}
      className="link min-h-6 shrink-0 text-label"
    >
      {isShown ? "Hide" : "Show"}
    </button>
  );
  return (
    <Field
      label="Password"
      type={isShown ? "text" : "password"}
      autoComplete="current-password"
      controlSize="large"
      trailing={show}
      error={errors.password?.message}
      {...form.register("password")}
    />
  );
}

/** Address, password, and the answer when they are not taken. */
export function SignInForm({ form, next }: SignInFormProps) {
  // The form object never changes, so its state is subscribed to here.
  const { errors, isSubmitting } = useFormState({ control: form.control });
  async function submit(fields: SignInFields) {
    try {
      await call("/session", { method: "POST", body: fields });
      // A whole new page, so that nothing of an earlier sign-in stays in memory.
      window.location.assign(next);
    } catch (error) {
      form.setError("root", { message: refusal(error) });
    }
  }
  const email = { type: "email", autoComplete: "username", ...form.register("email") };
  return (
    <form onSubmit={form.handleSubmit(submit)} noValidate className="self-start border-t-[1.5px] border-ink pt-3.5">
      <h2 className="mb-4.5 text-[1.3125rem]">Sign in</h2>
      <div className="flex flex-col gap-3.75">
        <Field label="Work email" controlSize="large" error={errors.email?.message} {...email} />
        <PasswordField form={form} />
        <div role="status" className="empty:-mt-3.75">
          {errors.root && <StateNote state="fail">{errors.root.message}</StateNote>}
        </div>
        <Button type="submit" kind="main" size="touch" refused={isSubmitting && "Signing in."}>
          {isSubmitting ? "Signing in" : "Sign in"}
        </Button>
      </div>
      <p className="mt-4.5 text-label text-ink-2">New here? Ask your team’s admin for a sign-in.</p>
    </form>
  );
}
