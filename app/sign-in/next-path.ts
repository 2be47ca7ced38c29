const home = "/runs";
// Only its own origin counts; the name never leaves this file.
const base = "http://ropewalk.invalid";

/**
 * Where to go after signing in.
 * @param next - what the address asked for
 * @returns a path of this site; the list of runs when it asked for anything else
 */
export function nextPath(next: string | string[] | undefined): string {
  if (typeof next !== "string" || !next.startsWith("/")) return home;
  const url = URL.parse(next, base);
  // "//elsewhere" and "/\elsewhere" begin with a stroke too, but lead to another site.
  if (url?.origin !== base || url.pathname.startsWith("//")) return home;
  return `${url.pathname}${url.search}${url.hash}`;
}
