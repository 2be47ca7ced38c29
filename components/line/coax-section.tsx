import type { CoaxShape } from "@/components/line/cable-shape";
import { material } from "@/components/line/materials";

const goldenAngle = Math.PI * (3 - Math.sqrt(5));

/** Bubbles of a foam, spread evenly over a ring. */
function FoamDots({ inner, outer }: { inner: number; outer: number }) {
  if (outer < 6.5) return null;
  const count = Math.min(44, Math.round(0.95 * outer));
  const radius = Math.max(0.55, outer * 0.024);
  const from = inner + radius * 2.5;
  const to = outer - radius * 2;
  return Array.from({ length: count }, (_, k) => {
    const r = Math.sqrt(from ** 2 + ((to ** 2 - from ** 2) * (k + 0.5)) / count);
    const angle = k * goldenAngle;
    return (
      <circle
        key={k}
        cx={(r * Math.cos(angle)).toFixed(2)}
        cy={(r * Math.sin(angle)).toFixed(2)}
        r={radius.toFixed(2)}
        fill="var(--dielectric-2)"
      />
    );
  });
}

/** Air held open by a few webs. */
function Webs({ inner, outer }: { inner: number; outer: number }) {
  const angles = [0, 1, 2, 3, 4].map((k) => (k * 2 * Math.PI) / 5 - Math.PI / 2);
  const spokes = angles.map((a) => {
    const [c, s] = [Math.cos(a), Math.sin(a)];
    return `M${(inner * c).toFixed(2)} ${(inner * s).toFixed(2)}L${(outer * c).toFixed(2)} ${(outer * s).toFixed(2)}`;
  });
  return <path d={spokes.join("")} stroke="var(--ghost)" strokeWidth={Math.max(0.8, outer * 0.07)} />;
}

/** One wire or a strand of seven, seen end-on. */
export function WireEnd({ x = 0, y = 0, r, isStranded }: { x?: number; y?: number; r: number; isStranded: boolean }) {
  if (!isStranded || r < 2.2) return <circle cx={x} cy={y} r={r.toFixed(2)} fill="var(--conductor)" />;
  const strand = r / 3;
  const ring = [0, 1, 2, 3, 4, 5].map((k) => (k * Math.PI) / 3);
  return (
    <g fill="var(--conductor)">
      <circle cx={x} cy={y} r={(strand * 0.96).toFixed(2)} />
      {ring.map((a) => (
        <circle
          key={a}
          cx={(x + 2 * strand * Math.cos(a)).toFixed(2)}
          cy={(y + 2 * strand * Math.sin(a)).toFixed(2)}
          r={(strand * 0.96).toFixed(2)}
        />
      ))}
    </g>
  );
}

/** A coaxial cable end-on, about the origin. */
export function CoaxSection({ shape, scale }: { shape: CoaxShape; scale: number }) {
  const px = (mm: number) => (mm * scale) / 2;
  const dielectric = px(shape.dielectricMm);
  const inner = Math.max(0.9, px(shape.innerMm));
  return (
    <>
      {shape.hasJacket && <circle r={px(shape.outerMm).toFixed(2)} fill="var(--jacket)" />}
      {shape.screen && (
        <circle
          r={px(shape.screen.outerMm).toFixed(2)}
          fill={shape.screen.covering === "braid" ? material.braid : "var(--shield)"}
          stroke={shape.screen.covering === "solid" ? "var(--shield-2)" : "none"}
          strokeWidth="0.6"
        />
      )}
      <circle
        r={dielectric.toFixed(2)}
        fill="var(--dielectric)"
        stroke={shape.screen?.covering === "solid" ? "var(--shield-2)" : "none"}
        strokeWidth="0.7"
      />
      {shape.dielectric === "foam" && <FoamDots inner={inner} outer={dielectric} />}
      {shape.dielectric === "airSpaced" && <Webs inner={inner} outer={dielectric} />}
      <WireEnd r={inner} isStranded={shape.isStranded} />
      {shape.isTube && inner > 3 && <circle r={(inner * 0.8).toFixed(2)} fill="var(--field)" />}
    </>
  );
}
