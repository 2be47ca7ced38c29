/** What can be asked of `/team/letters`. */
import { operation } from "@/lib/http/operation";
import { letterPageSchema, letterQuerySchema } from "@/lib/mail/schema";

export const readLetters = operation({
  id: "listLetters",
  method: "GET",
  path: "/team/letters",
  summary: "The letters the team's people were written: those that wait, were sent, or were given up.",
  permission: "team.readLetters",
  query: letterQuerySchema,
  answer: { status: 200, description: "A page of letters.", schema: letterPageSchema },
});
