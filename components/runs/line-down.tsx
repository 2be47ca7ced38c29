"use client";

import { StripDown, stripDownRoom } from "@/components/line/strip-down";
import type { StripActions } from "@/components/line/strip-list";
import { scaleOfPieces, type StripEnd, type StripPiece } from "@/components/line/strip-piece";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { WaveDown } from "@/components/plot/wave-down";
import { SpotConditions } from "@/components/runs/conditions";
import { EndButtons } from "@/components/runs/end-buttons";
import { voltTick } from "@/components/runs/wave-chart";
import type { StandingWave } from "@/lib/line/standing-wave";
import { inWords, scaled } from "@/lib/format/quantity";
import { plotted } from "@/lib/runs/curves";

interface Props extends StripActions {
  pieces: StripPiece[];
  source: StripEnd;
  load: StripEnd;
  wave: StandingWave | null;
  availablePowerW: number | null;
}

const heightPx = 620;

/** The line on a phone: it runs down the page, the standing wave beside it. */
export function LineDown({ pieces, source, load, wave, availablePowerW, ...actions }: Props) {
  const { ref, width } = useMeasuredWidth(358);
  const scale = scaleOfPieces(pieces, stripDownRoom.above, heightPx - stripDownRoom.below);
  return (
    <div ref={ref}>
      <div className="relative">
        <StripDown
          pieces={pieces}
          source={source}
          load={load}
          scale={scale}
          width={width}
          height={heightPx}
          {...actions}
        >
          {wave && (
            <WaveDown
              scale={scale}
              fromX={stripDownRoom.plotFromX}
              toX={stripDownRoom.plotToX}
              distancesM={Array.from(wave.positionM)}
              voltageV={plotted(wave.voltageV)}
              note={`rms, at ${inWords(scaled("power", availablePowerW, 3))}`}
              format={voltTick}
            />
          )}
        </StripDown>
        <EndButtons
          source={{ top: 0, height: scale.startX - 6 }}
          load={{ top: scale.endX + 10, height: stripDownRoom.below - 10 }}
        />
      </div>
      <div className="mt-3">
        <SpotConditions />
      </div>
    </div>
  );
}
