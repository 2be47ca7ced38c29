import type { Actor } from "@/lib/auth/actor";
import type { SignedIn } from "@/lib/team/schema";

/** Who is asking, as told to the browser. */
export function describeActor(actor: Actor): SignedIn {
  return {
    person: { id: actor.personId, name: actor.name, email: actor.email },
    team: { id: actor.teamId, name: actor.teamName },
    role: actor.role,
  };
}
