const bearer = /^bearer +(\S+) *$/i;

/**
 * The token of an `Authorization: Bearer` header; undefined without one. Another scheme (a proxy's own password) says
 * nothing about who asks us.
 */
export function bearerToken(headers: Headers): string | undefined {
  return bearer.exec(headers.get("authorization") ?? "")?.[1];
}
