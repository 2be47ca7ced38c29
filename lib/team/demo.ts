/** Who can sign in to the demo. Only there: outside the demo nobody's address or password is shown. */
import data from "@/seeds/data/team.json";

export interface DemoSignIn {
  name: string;
  email: string;
  role: string;
}

function isDemo(): boolean {
  return process.env.DEMO !== "off";
}

/** The demo's people, or null outside the demo. */
export function demoSignIns(): DemoSignIn[] | null {
  return isDemo() ? data.people.map(({ name, email, role }) => ({ name, email, role })) : null;
}

/** The one password of the demo's people, or null outside the demo. */
export function demoPassword(): string | null {
  return isDemo() ? data.password : null;
}
