/**
 * Runs before every page: gives it a content security policy with a nonce of its own, which Next puts on its tags, and
 * tells it its own path, so that whoever must sign in first comes back to it. Unreadable addresses end here.
 */
import { AppError, problem } from "@/lib/http/errors";
import { type NextRequest, NextResponse } from "next/server";

const isDevelopment = process.env.NODE_ENV === "development";

function policy(nonce: string): string {
  // Development compiles in the browser, styles by inline tags and reloads over a socket.
  const script = isDevelopment ? "'unsafe-eval'" : "";
  const style = isDevelopment ? "'unsafe-inline'" : `'nonce-${nonce}'`;
  const connect = isDevelopment ? "ws:" : "";
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic' ${script}`,
    `style-src 'self' ${style}`,
    // Drawings place and colour their parts by style attributes, which cannot run anything.
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    `connect-src 'self' ${connect}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ]
    .map((directive) => directive.trim())
    .join("; ");
}

function isDecodable(path: string): boolean {
  try {
    decodeURIComponent(path);
    return true;
  } catch {
    return false;
  }
}

export function proxy(request: NextRequest): NextResponse | Response {
  // A path whose % signs stand for no text would be a 500 further on.
  if (!isDecodable(new URL(request.url).pathname))
    return problem(new AppError("malformed", "This address cannot be read."));
  if (request.nextUrl.pathname.startsWith("/api/")) return NextResponse.next();
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const value = policy(nonce);
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("x-ropewalk-path", request.nextUrl.pathname + request.nextUrl.search);
  headers.set("content-security-policy", value);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", value);
  return response;
}

// Pages: the API answers no markup and files of the build need no nonce. Of the API only addresses with a % in them, so
// that bodies do not pass through here, which would cut them at 10 MB.
export const config = {
  matcher: ["/((?!api/|_next/static|_next/image|icon.svg|favicon.ico).*)", "/api/(.*%.*)"],
};
