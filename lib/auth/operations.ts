/** What can be asked of `/session`. */
import { operation } from "@/lib/http/operation";
import { passwordChangeSchema, signedInSchema, signInSchema } from "@/lib/team/schema";

export const readSession = operation({
  id: "readSession",
  method: "GET",
  path: "/session",
  summary: "Who is signed in, in which team, as what.",
  permission: "account.own",
  answer: { status: 200, description: "Who asks.", schema: signedInSchema },
});

export const openSession = operation({
  id: "openSession",
  method: "POST",
  path: "/session",
  summary: "Sign in. The answer sets the session cookie.",
  permission: null,
  body: signInSchema,
  answer: { status: 200, description: "Who is now signed in.", schema: signedInSchema },
  refusals: ["unauthenticated", "forbidden", "too_many_requests"],
});

export const endSession = operation({
  id: "endSession",
  method: "DELETE",
  path: "/session",
  summary: "Sign out.",
  permission: "account.own",
  answer: { status: 204, description: "The session has ended." },
});

export const changeOwnPassword = operation({
  id: "changeOwnPassword",
  method: "POST",
  path: "/session/password",
  summary: "Change one's own password and end one's other sessions.",
  permission: "account.own",
  body: passwordChangeSchema,
  answer: { status: 204, description: "The new password holds." },
  refusals: ["too_many_requests"],
});
