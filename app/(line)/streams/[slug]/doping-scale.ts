import type { DopingTick } from '@/app/_charts/stream-panel-layers';
import { formatNumber, formatSignedPercent } from '@/lib/format';
import { dopingTicks } from '@/lib/physics/doping-ticks';
import type { Target } from '@/lib/physics/target';

export interface DopingScale {
  ticks: DopingTick[];
  /** What the labels count, such as "10¹⁴ cm⁻³ phosphorus". */
  unit: string;
}

const COUNT = 6;

/**
 * The second scale of the level chart, in dopant: densities where the chart shows readings, percent off target where
 * it shows readings against expected. `range` is what the chart spans, in its own unit (`factor` × the quantity's).
 * Empty where the model gives none.
 */
export function dopingScale(
  target: Target,
  range: readonly [number, number],
  options: { isRelative: boolean; factor: number; sensitivity: number | null },
): DopingScale {
  const [low, high] = range;
  if (!(low < high)) return { ticks: [], unit: '' };
  if (options.isRelative) {
    const { sensitivity } = options;
    return {
      ticks: sensitivity === null ? [] : percentTicks(sensitivity, low, high),
      unit: `% ${target.dopant} off target`,
    };
  }
  const found = densitiesOn(target, Math.max(low, high / 20) / options.factor, high / options.factor);
  const exponent = Math.floor(Math.log10(target.densityPerCm3));
  const power = String(exponent).replace(/\d/g, (digit) => '⁰¹²³⁴⁵⁶⁷⁸⁹'.charAt(Number(digit)));
  return {
    ticks: found.map(({ densityPerCm3, value }) => ({
      value: value * options.factor,
      label: formatNumber(densityPerCm3 / 10 ** exponent, 3),
    })),
    unit: `10${power} cm⁻³ ${target.dopant}`,
  };
}

/** Round percents of dopant, each where its reading stands: 100·sensitivity·ln(1 + percent/100). */
function percentTicks(sensitivity: number, low: number, high: number): DopingTick[] {
  const percentAt = (value: number) => 100 * Math.expm1(value / 100 / sensitivity);
  const [from, to] = [percentAt(low), percentAt(high)].sort((a, b) => a - b) as [number, number];
  const rough = (to - from) / COUNT;
  const decade = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((one) => one * decade).find((one) => one >= rough) ?? rough;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const ticks: DopingTick[] = [];
  for (let nth = Math.ceil(from / step); nth * step <= to; nth += 1) {
    const percent = nth * step;
    if (percent <= -99) continue;
    const label = formatSignedPercent(percent, decimals).replace(/\s*%/, '');
    ticks.push({ value: 100 * sensitivity * Math.log1p(percent / 100), label: nth === 0 ? '0' : label });
  }
  return ticks;
}

/** Finding the ticks of a diffused layer takes some 15 ms: they are kept for a range rounded outwards to half a percent. */
const known = new Map<string, ReturnType<typeof dopingTicks>>();
const MOST_KNOWN = 500;
const GRID = Math.log(1.005);

function densitiesOn(target: Target, low: number, high: number): ReturnType<typeof dopingTicks> {
  if (!(low > 0)) return [];
  const [from, to] = [Math.floor(Math.log(low) / GRID), Math.ceil(Math.log(high) / GRID)];
  const key = JSON.stringify([target, from, to]);
  const found = known.get(key);
  if (found !== undefined) return found;
  if (known.size >= MOST_KNOWN) known.clear();
  const ticks = ticksOn(target, Math.exp(from * GRID), Math.exp(to * GRID));
  known.set(key, ticks);
  return ticks;
}

function ticksOn(target: Target, low: number, high: number): ReturnType<typeof dopingTicks> {
  try {
    return dopingTicks(target, low, high, COUNT);
  } catch (error) {
    if (error instanceof RangeError) return [];
    throw error;
  }
}
