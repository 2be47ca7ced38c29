/** The demo's team and its people, or, without the demo, a team with its first admin. */
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { members, people, teams } from "@/db/schema/team";
import { hashPassword } from "@/lib/auth/password";
import type { Role } from "@/lib/team/schema";
import { newPasswordSchema } from "@/lib/team/schema";
import data from "@/seeds/data/team.json";

interface Person {
  id: string;
  name: string;
  email: string;
  role: Role;
}

async function addPerson(teamId: string, { id, name, email, role }: Person, password: string): Promise<void> {
  const db = database();
  const isThere = db.select({ id: people.id }).from(people).where(eq(people.id, id)).get();
  if (isThere) return; // also spares the hashing
  const passwordHash = await hashPassword(password);
  const createdAt = new Date().toISOString();
  db.insert(people).values({ id, name, email, passwordHash, createdAt }).onConflictDoNothing().run();
  db.insert(members).values({ teamId, personId: id, role }).onConflictDoNothing().run();
}

/** Adds the demo team and its twelve people where they are missing. */
export async function seedTeam(): Promise<void> {
  const { id, name } = data.team;
  database().insert(teams).values({ id, name, createdAt: new Date().toISOString() }).onConflictDoNothing().run();
  for (const person of data.people) await addPerson(id, person as Person, data.password);
}

/**
 * Without the demo: the first team and its admin, from ADMIN_EMAIL, ADMIN_PASSWORD, ADMIN_NAME and TEAM_NAME, when there
 * is no team yet.
 * @returns a sentence about what was done or is missing; undefined when there is a team already
 * @throws Error when the password is too short
 */
export async function seedFirstAdmin(settings: NodeJS.ProcessEnv): Promise<string | undefined> {
  const db = database();
  if (db.select({ id: teams.id }).from(teams).get()) return undefined;
  const { ADMIN_EMAIL: email, ADMIN_PASSWORD: password, ADMIN_NAME: name, TEAM_NAME: teamName } = settings;
  if (!email || !password)
    return "Nobody can sign in yet. Set ADMIN_EMAIL and ADMIN_PASSWORD and start again to make the first admin.";
  const checked = newPasswordSchema.safeParse(password);
  if (!checked.success) throw new Error(`ADMIN_PASSWORD: ${checked.error.issues[0]?.message}`);
  const id = crypto.randomUUID();
  db.insert(teams)
    .values({ id, name: teamName || "Our team", createdAt: new Date().toISOString() })
    .run();
  const admin: Person = {
    id: crypto.randomUUID(),
    name: name || "Admin",
    email: email.trim().toLowerCase(),
    role: "admin",
  };
  await addPerson(id, admin, password);
  return `${admin.email} is now the admin of ${teamName || "Our team"}.`;
}
