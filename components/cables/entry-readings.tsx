import { Reading, Readings } from "@/components/ui/reading";
import { compareFigures } from "@/lib/cables/compare";
import type { Cable } from "@/lib/cables/schema";
import { digits, frequency, inWords, scaled, significantDigits } from "@/lib/format/quantity";
import { spotFigures } from "@/lib/line/spot-figures";
import { REFERENCE_TEMPERATURE_C, type ModelAtTemperature } from "@/lib/line/temperature";

interface Props {
  cable: Cable;
  warm: ModelAtTemperature;
  lossAtHz: number;
  /** whether the frequency asked lies outside the loss table */
  isBeyond: boolean;
}

/** The eight figures everybody asks for. Impedance, velocity, C and L are the model's at high frequency. */
export function EntryReadings({ cable, warm, lossAtHz, isBeyond }: Props) {
  const figures = compareFigures(cable, lossAtHz);
  const spot = spotFigures(warm.model, lossAtHz, REFERENCE_TEMPERATURE_C);
  const at = `at ${digits(warm.temperatureC, 0)} °C`;
  const voltage = scaled("voltage", figures.maxVoltageV, 2);
  return (
    <Readings className="mt-3.5 folded:grid folded:grid-cols-4 folded:gap-y-3 phone:grid-cols-2">
      <Reading label="Impedance" digits={digits(figures.z0Ohm, 1)} unit="Ω" spoken="ohms" />
      <Reading label="Velocity factor" digits={digits(figures.velocityFactor, 3)} />
      <Reading
        label="Capacitance"
        digits={digits(figures.capacitanceFPerM * 1e12, 1)}
        unit="pF/m"
        spoken="picofarads per metre"
      />
      <Reading
        label="Inductance"
        digits={digits(figures.inductanceHPerM * 1e9, 0)}
        unit="nH/m"
        spoken="nanohenries per metre"
      />
      <Reading label="Delay" digits={digits(figures.delaySPerM * 1e9, 2)} unit="ns/m" spoken="nanoseconds per metre" />
      <Reading
        label={`Loss at ${inWords(frequency(lossAtHz))}`}
        digits={digits(spot.attenuationDbPerM * 100, 2)}
        unit="dB/100 m"
        spoken="decibels per 100 metres"
        state={isBeyond ? "warn" : undefined}
        target={isBeyond ? `beyond the data, ${at}` : at}
      />
      <Reading
        label="Loop resistance, dc"
        digits={significantDigits(spot.dcResistanceOhmPerM * 1e3, 3)}
        unit="mΩ/m"
        spoken="milliohms per metre"
        target={at}
      />
      <Reading
        label="Highest voltage"
        digits={voltage.digits}
        unit={figures.maxVoltageV === null ? "" : `${voltage.unit} rms`}
        spoken={figures.maxVoltageV === null ? "" : `${voltage.spoken} r m s`}
        target={figures.maxVoltageV === null ? "not given" : undefined}
      />
    </Readings>
  );
}
