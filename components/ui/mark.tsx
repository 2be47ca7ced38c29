import { strands } from "@/components/ui/strands";

const paths = strands({ fromX: 1.5, toX: 44.5, middleY: 11, amplitude: 6.6, pitch: 43 / 3 });

interface MarkProps {
  /** px; 18 is the smallest that still reads as two strands */
  height?: number;
  /** for print: both strands in ink */
  isOneColour?: boolean;
  /** what the mark stands on, so that the strand in front can be cut free of the one behind */
  ground?: string;
}

/** Two strands crossing three times: a rope, a twisted pair and a standing wave. */
export function Mark({ height = 20, isOneColour = false, ground = "var(--paper)" }: MarkProps) {
  const copper = isOneColour ? "var(--ink)" : "var(--copper)";
  return (
    <svg
      width={(height * 46) / 22}
      height={height}
      viewBox="0 0 46 22"
      fill="none"
      aria-hidden="true"
      className="shrink-0 overflow-visible"
    >
      <path d={paths.first} stroke="var(--ink)" strokeWidth="3.6" strokeLinecap="round" />
      <path d={paths.second} stroke={ground} strokeWidth="7" />
      <path d={paths.second} stroke={copper} strokeWidth="3.6" strokeLinecap="round" />
      <path d={paths.firstGap} stroke={ground} strokeWidth="7" />
      <path d={paths.firstRising} stroke="var(--ink)" strokeWidth="3.6" />
    </svg>
  );
}

/** Mark and name together. */
export function Wordmark({ size = "bar" }: { size?: "bar" | "front" }) {
  const isFront = size === "front";
  return (
    <span
      className={`flared flex items-center tracking-[-0.012em] ${isFront ? "gap-4 text-[2.125rem] leading-[1.12]" : "gap-2.25 text-[1.1875rem]"}`}
    >
      <Mark height={isFront ? 38 : 20} />
      Ropewalk
    </span>
  );
}
