import type { SmithChartProps } from "@/components/plot/smith-chart";
import { seriesColour, seriesDash } from "@/components/plot/series";

interface SmithKeyProps extends Pick<SmithChartProps, "traces" | "steps" | "target"> {
  /** |Γ| at the frame now */
  shown: number;
  /** |Γ| at the frame of the centre view */
  fitted: number;
  isFull: boolean;
  onToggle: () => void;
}

function Stroke({ colour, dash, width = 1.75 }: { colour: string; dash?: string; width?: number }) {
  return (
    <svg width="30" height="6" aria-hidden="true" className="block">
      <path d="M0 3H30" stroke={colour} strokeDasharray={dash} strokeWidth={width} />
    </svg>
  );
}

/** What is what in the plane, and the switch between its centre and the whole. */
export function SmithKey({ traces, steps, target, shown, fitted, isFull, onToggle }: SmithKeyProps) {
  return (
    <div className="flex max-w-40 flex-col gap-2.5 pt-8 text-note text-ink-2 phone:pt-0">
      {traces.map(({ id, label, look }) => (
        <div key={id}>
          <Stroke colour={seriesColour[look]} dash={look === 5 ? undefined : seriesDash[look]} />
          <span className="font-[560] text-ink">{label}</span>
        </div>
      ))}
      {steps && (
        <div>
          <Stroke colour="var(--ink)" dash="1.5 2.5" width={1.3} />
          {steps.label}
        </div>
      )}
      {target && (
        <div className="flex items-center gap-1.5">
          <svg width="15" height="15" aria-hidden="true">
            <circle cx="7.5" cy="7.5" r="6.5" fill="var(--pass-wash)" stroke="var(--pass)" />
          </svg>
          {target.label}
        </div>
      )}
      <div>
        edge is |Γ| <span className="figures">{shown.toFixed(2)}</span>
      </div>
      {fitted < 1 && (
        <button
          type="button"
          aria-pressed={isFull}
          onClick={onToggle}
          className="link min-h-6 self-start text-label print:hidden"
        >
          {isFull ? "The centre" : "The whole chart"}
        </button>
      )}
    </div>
  );
}
