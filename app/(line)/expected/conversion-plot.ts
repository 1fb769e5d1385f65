import type { CurvePlotProps } from '@/app/_charts/curve-plot';
import { formatDensityPerCm3, formatResistivity } from '@/lib/format';
import { conversionCurve } from '@/lib/physics/conversion-curve';
import { DOPANTS, type Dopant } from '@/lib/physics/dopant';
import { resistivityAtTemperature } from '@/lib/physics/resistivity-at-temperature';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

const PER_DECADE = 12;

/** Resistivity against doping for every dopant at a temperature, with one density, if any, marked on its own curve. */
export function conversionPlot(
  dopant: Dopant,
  densityPerCm3: number | null,
  temperatureC: number,
): CurvePlotProps {
  const at = densityPerCm3 === null ? null : resistivityAt(dopant, densityPerCm3, temperatureC);
  const point = at === null || densityPerCm3 === null ? [] : [{ x: densityPerCm3, y: at }];
  const words = `${formatDensityPerCm3(densityPerCm3)}, ${formatResistivity(at)}`;
  return {
    title: `Resistivity against doping at ${temperatureC} °C, for ${DOPANTS.join(', ')}${point.length === 0 ? '' : `; ${dopant} of ${words} is marked`}.`,
    x: { label: 'dopant density, cm⁻³', domain: [1e12, 1e21], isLog: true },
    y: { label: `resistivity at ${temperatureC} °C, Ω·cm`, domain: [1e-4, 3e4], isLog: true },
    curves: DOPANTS.map((one) => ({
      name: one,
      isOwn: one === dopant,
      pieces: conversionCurve(one, temperatureC, PER_DECADE).map((piece) =>
        piece.map((place) => ({ x: place.densityPerCm3, y: place.resistivityOhmCm })),
      ),
    })),
    marks: point.map((place) => ({ ...place, label: words, kind: 'expected' as const })),
  };
}

/** Of one dopant alone; null outside the conversion. */
export function resistivityAt(dopant: Dopant, densityPerCm3: number, temperatureC: number): number | null {
  try {
    const at23C = standardResistivity(dopant, densityPerCm3);
    return resistivityAtTemperature(dopant, densityPerCm3, at23C, temperatureC);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
