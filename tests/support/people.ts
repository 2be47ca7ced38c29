/** A small invented team with one person of each role, and a second team beside it; for tests only. */
import { database } from "@/db/client";
import { members, people, teams } from "@/db/schema/team";
import type { Actor, Role } from "@/lib/auth/actor";
import { hashPassword } from "@/lib/auth/password";

export const roles: Role[] = ["designer", "librarian", "admin", "installer", "auditor"];
export const password = "three blue buoys";

export const home = { id: "skerry-light", name: "Skerry Light" };
export const other = { id: "fen-drainage", name: "Fen Drainage" };

const createdAt = "2026-01-01T00:00:00.000Z";

/** The person with a role in a team. */
export function actor(role: Role, team: { id: string; name: string } = home): Actor {
  const personId = `${team.id}-${role}`;
  return {
    personId,
    name: `${team.name} ${role}`,
    email: `${role}@${team.id}.example`,
    teamId: team.id,
    teamName: team.name,
    role,
  };
}

/** Adds both teams, with one person of each role in the first and a designer and an admin in the second. */
export async function addPeople(): Promise<void> {
  const passwordHash = await hashPassword(password);
  const db = database();
  const everyone = [...roles.map((role) => actor(role)), actor("designer", other), actor("admin", other)];
  for (const { id, name } of [home, other]) db.insert(teams).values({ id, name, createdAt }).run();
  for (const { personId, name, email, teamId, role } of everyone) {
    db.insert(people).values({ id: personId, name, email, passwordHash, createdAt }).run();
    db.insert(members).values({ teamId, personId, role }).run();
  }
}
