/** One hook with nothing on it. */
export function Hook() {
  return (
    <svg width="120" height="100" aria-hidden="true" fill="none" className="block shrink-0">
      <path d="M6 14H114" stroke="var(--ink)" strokeWidth="1.5" />
      <path d="M60 14V30" stroke="var(--rule)" strokeDasharray="2 3" />
      <circle cx="60" cy="62" r="31" stroke="var(--rule)" strokeWidth="1.5" strokeDasharray="4 5" />
    </svg>
  );
}
