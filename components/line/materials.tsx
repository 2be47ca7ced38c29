/**
 * The fills that cables and marks are drawn with: braid, foam, hatching. Stands once on every page (in the root
 * layout); drawings refer to it by id.
 */
export const material = {
  braid: "url(#rw-braid)",
  foam: "url(#rw-foam)",
  hatch: "url(#rw-hatch)",
  hatchFail: "url(#rw-hatch-fail)",
  hatchPass: "url(#rw-hatch-pass)",
} as const;

interface HatchProps {
  id: string;
  size: number;
  angle: number;
  colour: string;
  opacity?: number;
}

function Hatch({ id, size, angle, colour, opacity }: HatchProps) {
  return (
    <pattern id={id} width={size} height={size} patternUnits="userSpaceOnUse" patternTransform={`rotate(${angle})`}>
      <path d={`M0 0V${size}`} stroke={colour} strokeWidth="1" opacity={opacity} />
    </pattern>
  );
}

export function Materials() {
  return (
    <svg width="0" height="0" className="absolute" aria-hidden="true">
      <defs>
        <pattern id="rw-braid" width="6" height="6" patternUnits="userSpaceOnUse">
          <rect width="6" height="6" fill="var(--shield)" />
          <path d="M0 0L6 6M6 0L0 6" stroke="var(--shield-2)" strokeWidth="0.9" />
        </pattern>
        <pattern id="rw-foam" width="7" height="7" patternUnits="userSpaceOnUse">
          <rect width="7" height="7" fill="var(--dielectric)" />
          <circle cx="1.6" cy="1.8" r="0.8" fill="var(--ghost)" />
          <circle cx="5.2" cy="5.1" r="0.8" fill="var(--ghost)" />
        </pattern>
        <Hatch id="rw-hatch" size={5} angle={45} colour="var(--rule)" />
        <Hatch id="rw-hatch-fail" size={6} angle={45} colour="var(--fail)" opacity={0.55} />
        <Hatch id="rw-hatch-pass" size={6} angle={-45} colour="var(--pass)" opacity={0.35} />
      </defs>
    </svg>
  );
}
