/** Where a request comes from: the page behind it, and the network address. */
import { bearerToken } from "@/lib/auth/bearer";
import type { Actor } from "@/lib/auth/actor";
import { madeForHeader } from "@/lib/http/call";
import { AppError } from "@/lib/http/errors";

function ownOrigins(request: Request): string[] {
  const { host: urlHost } = new URL(request.url);
  const host = request.headers.get("host") ?? urlHost;
  const publicUrl = process.env.PUBLIC_URL;
  return [
    `http://${host}`,
    `https://${host}`,
    ...(publicUrl && URL.canParse(publicUrl) ? [new URL(publicUrl).origin] : []),
  ];
}

/** Whether the request was made by one of our own pages: Sec-Fetch-Site says so, else Origin; undefined when neither is sent. */
function isFromOwnPage(request: Request): boolean | undefined {
  const site = request.headers.get("sec-fetch-site");
  if (site !== null) return site === "same-origin";
  const origin = request.headers.get("origin");
  return origin === null ? undefined : ownOrigins(request).includes(origin);
}

const changing = (request: Request) => request.method !== "GET" && request.method !== "HEAD";

/**
 * Refuses a change that the browser's cookie would let through on behalf of another site's page. Requests with a token
 * need no such check: no page can make a browser send one.
 * @throws AppError `forbidden` unless the request says that it comes from the same origin
 */
export function refuseCrossSite(request: Request): void {
  if (changing(request) && bearerToken(request.headers) === undefined && isFromOwnPage(request) !== true)
    throw new AppError("forbidden", "A change made with the sign-in cookie must come from this site.");
}

/**
 * Refuses a change from a page that was made for somebody else than the cookie now says: two tabs share one cookie.
 * @throws AppError `conflict`
 */
export function refuseOtherPerson(request: Request, { personId, name }: Actor): void {
  const madeFor = request.headers.get(madeForHeader);
  if (madeFor === null || madeFor === personId || !changing(request)) return;
  const message = `${name} has signed in in this browser since this page was opened. Nothing was changed; load the page again.`;
  throw new AppError("conflict", message);
}

/**
 * For signing in, which needs no cookie: a script, which sends neither header, may; another site's page may not.
 * @throws AppError `forbidden`
 */
export function refuseOtherPage(request: Request): void {
  if (isFromOwnPage(request) === false) throw new AppError("forbidden", "Sign in from this site.");
}

/**
 * The network address a request came from. The server itself listens on this machine only, so whoever asks from elsewhere
 * came through a proxy; what that proxy says (the last of `X-Forwarded-For`) counts only where `TRUST_PROXY` is on, since
 * otherwise anybody may write that header.
 */
export function networkAddress(request: Request): string {
  if (process.env.TRUST_PROXY !== "on") return "this machine";
  return request.headers.get("x-forwarded-for")?.split(",").at(-1)?.trim() || "unknown";
}
