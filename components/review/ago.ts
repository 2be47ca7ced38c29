const minute = 60_000;
const units = [
  { name: "day", ms: 24 * 60 * minute },
  { name: "hour", ms: 60 * minute },
  { name: "minute", ms: minute },
] as const;

/** "4 days", "5 hours": how long a moment lies before another; both ISO 8601. */
export function ago(at: string, now: string): string {
  const passed = Date.parse(now) - Date.parse(at);
  const unit = units.find(({ ms }) => passed >= ms);
  if (!unit) return "just now";
  const count = Math.floor(passed / unit.ms);
  return `${count} ${unit.name}${count === 1 ? "" : "s"}`;
}
