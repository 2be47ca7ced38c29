/** First letters of the first and the last name. */
export function initials(name: string): string {
  const parts = name.trim().split(/\s+/).filter(Boolean);
  const first = parts[0]?.[0] ?? "";
  const last = parts.length > 1 ? (parts[parts.length - 1]?.[0] ?? "") : "";
  return (first + last).toUpperCase();
}

/** A member: a ring with initials. The name stands beside it or in its title. */
export function MemberDisc({ name, size = 26 }: { name: string; size?: number }) {
  return (
    <span
      title={name}
      aria-hidden="true"
      className="inline-flex shrink-0 items-center justify-center rounded-full border-[1.5px] border-ink bg-paper text-note font-[640] text-ink"
      style={{ width: size, height: size }}
    >
      {initials(name)}
    </span>
  );
}
