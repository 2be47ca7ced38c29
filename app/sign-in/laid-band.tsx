import { strands } from "@/components/ui/strands";

const width = 2700;
const band = strands({ fromX: -20, toX: width, middleY: 77, amplitude: 54, pitch: 150, topAtX: 40 });

/** A wave on a line that loses a little: its ripples grow towards the end they come back from. */
function ripple(phase: 1 | -1): string {
  const points = Array.from({ length: width / 3 + 1 }, (_, i) => {
    const x = 3 * i;
    const swing = 9 + 17 * (x / 1440) ** 1.6;
    return `${x} ${(34 + phase * Math.min(30, swing) * Math.cos((2 * Math.PI * (x - 38)) / 75)).toFixed(1)}`;
  });
  return `M${points.join("L")}`;
}

const ticks = Array.from({ length: width / 36 }, (_, i) => `M${36 * i} 92v${i % 10 === 0 ? -9 : -5}`).join("");

/** The two strands across the page, the standing wave they carry, and a rule. */
export function LaidBand() {
  return (
    <div aria-hidden="true" className="w-full overflow-hidden pt-6">
      <svg
        width={width}
        height="154"
        className="block phone:h-20"
        viewBox={`0 0 ${width} 154`}
        preserveAspectRatio="xMinYMid slice"
      >
        <g fill="none" strokeWidth="46">
          <path d={band.second} stroke="var(--jacket)" />
          <path d={band.first} stroke="var(--paper)" strokeWidth="58" />
          <path d={band.first} stroke="var(--copper-fill)" />
          <path d={band.secondGap} stroke="var(--paper)" strokeWidth="58" />
          <path d={band.secondRising} stroke="var(--jacket)" />
        </g>
      </svg>
      <svg width={width} height="93" className="mt-14 block phone:mt-4" fill="none">
        <path d={ripple(1)} stroke="var(--series-1)" strokeWidth="1.6" />
        <path d={ripple(-1)} stroke="var(--series-2)" strokeWidth="1.1" />
        <path d={`M0 92H${width}${ticks}`} stroke="var(--rule)" />
      </svg>
    </div>
  );
}
