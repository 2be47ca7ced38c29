/** Who is asking: the first argument of every service function. */
import "server-only";
import type { Route } from "next";
import { cache } from "react";
import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { bearerToken } from "@/lib/auth/bearer";
import { sentCookie, unsealedKey } from "@/lib/auth/cookie";
import { findSessionActor, findTokenActor } from "@/lib/auth/service";
import { AppError } from "@/lib/http/errors";
import type { Role } from "@/lib/team/schema";

export type { Role };

export interface Actor {
  personId: string;
  name: string;
  email: string;
  teamId: string;
  teamName: string;
  role: Role;
  /** the session asked through; undefined for a token */
  sessionId?: string;
}

async function findActor(sent: Headers): Promise<Actor | undefined> {
  const token = bearerToken(sent);
  if (token !== undefined) return findTokenActor(token);
  const sealed = sentCookie(sent);
  const key = sealed === undefined ? undefined : await unsealedKey(sealed);
  return key === undefined ? undefined : findSessionActor(key);
}

/**
 * Who sent a request, by its token or its cookie; a token that is not good is not made up for by a cookie.
 * @throws AppError `unauthenticated`
 */
export async function requestActor(request: Request): Promise<Actor> {
  const actor = await findActor(request.headers);
  if (actor) return actor;
  throw new AppError("unauthenticated", "Sign in first.", {}, { headers: { "WWW-Authenticate": "Bearer" } });
}

/** Who looks at a page, or undefined. For the sign-in page. */
export const findCurrentActor = cache(async (): Promise<Actor | undefined> => findActor(await headers()));

/** Who looks at a page or calls an action; whoever is not signed in is sent to the door and comes back to the page after. */
export async function currentActor(): Promise<Actor> {
  const actor = await findCurrentActor();
  if (actor) return actor;
  const path = (await headers()).get("x-ropewalk-path");
  redirect((path === null ? "/sign-in" : `/sign-in?next=${encodeURIComponent(path)}`) as Route);
}
