/** Teams and the people in them. */
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { members, people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import type { Role, SignedIn } from "@/lib/team/schema";

/** Who is asking, as told to the browser. */
export function describeActor(actor: Actor): SignedIn {
  return {
    person: { id: actor.personId, name: actor.name, email: actor.email },
    team: { id: actor.teamId, name: actor.teamName },
    role: actor.role,
  };
}

/** The names of the actor's team, by name: for showing who owns or changed what. */
export function listMembers(actor: Actor): { personId: string; name: string; role: Role }[] {
  return database()
    .select({ personId: people.id, name: people.name, role: members.role })
    .from(members)
    .innerJoin(people, eq(people.id, members.personId))
    .where(eq(members.teamId, actor.teamId))
    .orderBy(people.name)
    .all();
}
