/** Calls route handlers as a browser or a script would, with plain requests. */
import { insertSession } from "@/tests/support/sessions";
import { sealedCookie } from "@/lib/auth/cookie";
import type { Actor } from "@/lib/auth/actor";
import type { Handler } from "@/lib/http/handle";

export const base = "http://ropewalk.test/api/v1";

interface Sent {
  as?: Actor;
  body?: unknown;
  /** sent as it is, instead of `body` as JSON */
  text?: string | Uint8Array<ArrayBuffer> | FormData;
  headers?: Record<string, string>;
  params?: Record<string, string>;
  path?: string;
}

/** The Cookie header of a browser in which somebody has signed in. */
export async function cookieOf(actor: Actor): Promise<string> {
  const line = await sealedCookie(insertSession(actor), new Headers());
  return line.split(";")[0] ?? "";
}

/** Sends a request to a handler; with a body it is JSON, with `as` it comes from our own page with that person's cookie. */
export async function send(handler: Handler, method: string, sent: Sent = {}): Promise<Response> {
  const { as, body, text, params = {}, path = "/" } = sent;
  const headers = new Headers();
  if (as) headers.set("cookie", await cookieOf(as));
  if (as) headers.set("sec-fetch-site", "same-origin");
  const content = text ?? (body === undefined ? undefined : JSON.stringify(body));
  if (content !== undefined && !(content instanceof FormData)) headers.set("content-type", "application/json");
  for (const [name, value] of Object.entries(sent.headers ?? {})) headers.set(name, value);
  const request = new Request(`${base}${path}`, { method, headers, body: content });
  return handler(request, { params: Promise.resolve(params) });
}

/** The answer's JSON, after checking its status. */
export async function jsonOf<T = Record<string, unknown>>(response: Response, status = 200): Promise<T> {
  const text = await response.text();
  if (response.status !== status) throw new Error(`expected ${status}, got ${response.status}: ${text}`);
  return JSON.parse(text) as T;
}

/** The paths a problem document complains about. */
export async function pathsOf(response: Response): Promise<string[]> {
  const { errors = [] } = (await response.json()) as { errors?: { path: string }[] };
  return errors.map(({ path }) => path);
}
