/** Who can sign in to the demo. Only there: outside the demo nobody's address or password is shown. */
import data from "@/seeds/data/team.json";

export interface DemoSignIn {
  name: string;
  email: string;
  role: string;
}

/**
 * Whether this is the demo: DEMO unset or "on" is, "off" is not.
 * @throws Error for anything else, so that a slip of the pen never opens the demo's public passwords
 */
export function isDemo(): boolean {
  const said = process.env.DEMO ?? "";
  if (said === "" || said === "on") return true;
  if (said === "off") return false;
  throw new Error(`DEMO is "on" or "off", not "${said}".`);
}

/** The demo's people, or null outside the demo. */
export function demoSignIns(): DemoSignIn[] | null {
  return isDemo() ? data.people.map(({ name, email, role }) => ({ name, email, role })) : null;
}

/** The one password of the demo's people, or null outside the demo. */
export function demoPassword(): string | null {
  return isDemo() ? data.password : null;
}
