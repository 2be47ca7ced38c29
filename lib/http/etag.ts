/** Versions as entity tags (RFC 9110, section 8.8.3 and 13.1.1). */
import { AppError } from "@/lib/http/errors";

export function entityTag(version: number | string): string {
  return `"${version}"`;
}

/**
 * The version a change was made to, by the request's If-Match.
 * @param current - the version there is
 * @param stale - the refusal when the request means another one
 * @throws AppError `precondition_required` without the header
 */
export function requireMatch<Version extends number | string>(
  request: Request,
  current: Version,
  stale: () => AppError,
): Version {
  const header = request.headers.get("if-match");
  if (header === null)
    throw new AppError("precondition_required", "Say which version you changed: send its ETag in If-Match.");
  const tags = header.split(",").map((tag) => tag.trim());
  // A weak tag (W/"3") never matches here: a change needs the strong comparison.
  if (!tags.includes("*") && !tags.includes(entityTag(current))) throw stale();
  return current;
}
