/** People and their roles on the wire. Pure. */
import { z } from "zod";

export const roleSchema = z.enum(["designer", "librarian", "admin", "installer", "auditor"]);
export type Role = z.infer<typeof roleSchema>;

/** Who is signed in, in which team, as what. */
export const signedInSchema = z
  .strictObject({
    person: z.strictObject({ id: z.string(), name: z.string(), email: z.string() }),
    team: z.strictObject({ id: z.string(), name: z.string() }),
    role: roleSchema,
  })
  .meta({ id: "SignedIn" });
export type SignedIn = z.infer<typeof signedInSchema>;

const shortestPassword = 10;
const longestPassword = 200;

export const newPasswordSchema = z
  .string({ error: "The password must be text." })
  .min(shortestPassword, { error: `A password has at least ${shortestPassword} characters.` })
  .max(longestPassword, { error: `A password has at most ${longestPassword} characters.` });

const typedPassword = (what: string) =>
  z
    .string({ error: `${what} must be text.` })
    .min(1, { error: `${what} is needed.` })
    .max(longestPassword, { error: `A password has at most ${longestPassword} characters.` });

export const signInSchema = z
  .strictObject({
    email: z
      .string({ error: "The mail address must be text." })
      .trim()
      .toLowerCase()
      .min(1, { error: "The mail address is needed." })
      .max(254, { error: "A mail address has at most 254 characters." }),
    password: typedPassword("The password"),
  })
  .meta({ id: "SignIn" });
export type SignIn = z.infer<typeof signInSchema>;

export const passwordChangeSchema = z
  .strictObject({ current: typedPassword("The current password"), next: newPasswordSchema })
  .meta({ id: "PasswordChange" });
export type PasswordChange = z.infer<typeof passwordChangeSchema>;
