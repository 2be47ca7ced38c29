/** Who may do what: the one table. Whether a particular record is theirs to see is the services' business. */
import { AppError } from "@/lib/http/errors";
import type { Actor, Role } from "@/lib/auth/actor";

const everyone: readonly Role[] = ["designer", "librarian", "admin", "installer", "auditor"];

export const permissions = {
  /** approved entries of the catalogue; of installers only the cables in their runs */
  "cables.read": everyone,
  /** the whole catalogue rather than the cables in one's own runs */
  "cables.readCatalogue": ["designer", "librarian", "admin", "auditor"],
  /** drafts and reviews of others */
  "cables.readUnapproved": ["librarian", "admin", "auditor"],
  /** runs; of installers only issued ones assigned to them */
  "runs.read": everyone,
  /** every run of the team */
  "runs.readAll": ["designer", "librarian", "admin", "auditor"],
  /** create, change and remove any run of the team */
  "runs.write": ["designer", "librarian", "admin"],
  /** say something about a run one may see */
  "runs.comment": ["designer", "librarian", "admin"],
  /** draft an entry of one's own; take back a draft that was never submitted */
  "cables.propose": ["designer", "librarian", "admin"],
  /** approve, return, restrict, quarantine, release, supersede and withdraw; what the house rules forbid still holds */
  "cables.review": ["librarian", "admin"],
  /** say that something is wrong with a cable */
  "cables.report": ["designer", "librarian", "admin", "installer"],
  /** bring in many entries at once */
  "cables.import": ["librarian", "admin"],
  /** what was brought in at once, and the rows that became nothing */
  "cables.readImports": ["librarian", "admin", "auditor"],
  /** take the catalogue out */
  "cables.export": ["designer", "librarian", "admin", "auditor"],
  /** every run a cable is used in; a designer, of their own runs */
  "cables.readUses": ["designer", "librarian", "admin", "auditor"],
  /** the letters the team has sent and those that wait */
  "team.readLetters": ["admin", "auditor"],
  /** change what the team has agreed on */
  "team.rules": ["admin"],
  "team.readRules": ["admin", "auditor"],
  /** say something of a revision one may read */
  "cables.comment": ["designer", "librarian", "admin"],
  /** limit lines of the team's own */
  "limits.write": ["librarian", "admin"],
  /** take back anybody's draft; hand over anybody's run */
  "team.tidy": ["librarian", "admin"],
  /** computing, which stores nothing */
  "compute.use": everyone,
  /** one's own notices */
  "notices.own": everyone,
  /** one's own sign-in and password */
  "account.own": everyone,
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof permissions;

/** Whether the actor's role has the permission. */
export function may(actor: Actor, permission: Permission): boolean {
  return (permissions[permission] as readonly Role[]).includes(actor.role);
}

const named: Record<Role, string> = {
  designer: "A designer",
  librarian: "A librarian",
  admin: "An admin",
  installer: "An installer",
  auditor: "An auditor",
};

/** @throws AppError `forbidden` when the actor's role lacks the permission */
export function requirePermission(actor: Actor, permission: Permission): void {
  if (!may(actor, permission)) throw new AppError("forbidden", `${named[actor.role]} may not do this.`);
}
