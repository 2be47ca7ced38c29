/** The session cookie: a sealed key that only the server can make or read. */
import "server-only";
import { sealData, unsealData } from "iron-session";
import { sessionSecret } from "@/lib/auth/secret";

export const cookieName = "ropewalk-session";
export const sessionSeconds = 14 * 24 * 3600;

/** Whether the person's browser speaks https to us: then the cookie must never go over plain http. */
export function isServedSecurely(headers: Headers): boolean {
  if (process.env.PUBLIC_URL) return process.env.PUBLIC_URL.startsWith("https:");
  return headers.get("x-forwarded-proto")?.split(",").at(-1)?.trim() === "https";
}

function setCookie(value: string, seconds: number, headers: Headers): string {
  const secure = isServedSecurely(headers) ? "; Secure" : "";
  return `${cookieName}=${value}; Path=/; Max-Age=${seconds}; HttpOnly; SameSite=Lax${secure}`;
}

/** The Set-Cookie line that signs a browser in with a session's key. */
export async function sealedCookie(key: string, headers: Headers): Promise<string> {
  const sealed = await sealData({ key }, { password: sessionSecret(), ttl: sessionSeconds });
  return setCookie(sealed, sessionSeconds, headers);
}

/** The Set-Cookie line that makes a browser forget. */
export function clearedCookie(headers: Headers): string {
  return setCookie("", 0, headers);
}

/** The cookie's value in a request's Cookie header. */
export function sentCookie(headers: Headers): string | undefined {
  for (const part of headers.get("cookie")?.split(";") ?? []) {
    const [name, value] = part.trim().split("=", 2);
    if (name === cookieName && value) return value;
  }
  return undefined;
}

/** The session's key inside a sealed value; undefined when it was not sealed by us or is too old. */
export async function unsealedKey(sealed: string): Promise<string | undefined> {
  try {
    const content: unknown = await unsealData(sealed, { password: sessionSecret(), ttl: sessionSeconds });
    if (typeof content !== "object" || content === null || !("key" in content)) return undefined;
    return typeof content.key === "string" ? content.key : undefined;
  } catch {
    return undefined; // a mangled seal is no seal
  }
}
