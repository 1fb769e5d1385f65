import { densityFromMeasured } from './density-from-measured';
import { isCompensated } from './compensated-target';
import { densitySensitivity } from './density-sensitivity';
import { missingForExpected } from './missing-for-expected';
import { modelDensityLimits } from './model-density-limits';
import { modelValue } from './model-value';
import type { Target } from './target';

/** One mark of the doping scale: a round density and the reading at which it stands. */
export interface DopingTick {
  densityPerCm3: number;
  value: number;
}

/**
 * The marks of a second scale in dopant density beside an axis of readings from `lower` to `upper`: about `count`
 * round densities whose (calibrated) values lie on the axis, in rising density, so in falling value.
 *
 * The axis stays one of readings and the marks stand where physics puts them, closer where doping tells less.
 * Readings in Ω·cm or Ω/□. Along a crystal the marks are densities in the wafer. Empty where the axis lies outside
 * the conversion. Throws RangeError unless lower < upper and count ≥ 1.
 */
export function dopingTicks(target: Target, lower: number, upper: number, count: number): DopingTick[] {
  if (!(lower < upper) || !(count >= 1)) {
    throw new RangeError(
      `Ticks need a rising axis and a count of one or more, not ${lower}…${upper}, ${count}.`,
    );
  }
  if (missingForExpected(target, { ingotFraction: 0 }) !== null) return [];
  // The counter dopant's density differs from wafer to wafer, or leads: no one scale of the own dopant falls with the value.
  if (
    isCompensated(target) &&
    (target.alongCrystal || densitySensitivity(target, target.densityPerCm3) > 0)
  ) {
    return [];
  }
  const limits = modelDensityLimits(target);
  const factor = target.calibrationFactor ?? 1;
  const value = (densityPerCm3: number): number => factor * modelValue(target, densityPerCm3);
  const [highest, lowest] = [value(limits.lowerPerCm3), value(limits.upperPerCm3)];
  if (upper <= lowest || lower >= highest) return [];
  const from = upper >= highest ? limits.lowerPerCm3 : densityFromMeasured(target, upper);
  const to = lower <= lowest ? limits.upperPerCm3 : densityFromMeasured(target, lower);
  if (from === null || to === null) return [];
  return roundDensities(from, to, count)
    .filter((d) => d >= limits.lowerPerCm3 && d <= limits.upperPerCm3)
    .map((densityPerCm3) => ({ densityPerCm3, value: value(densityPerCm3) }))
    .filter((tick) => tick.value >= lower && tick.value <= upper);
}

/** Round numbers from `from` to `to`: over more than a decade 1, 2, 5 in each or the decades alone, else even steps. */
function roundDensities(from: number, to: number, count: number): number[] {
  const decades = Math.log10(to / from);
  if (decades > 1) {
    const mantissas = decades * 3 <= count * 1.5 ? [1, 2, 5] : [1];
    const stride = Math.max(1, Math.round(decades / count));
    const exponents: number[] = [];
    for (let e = Math.floor(Math.log10(from)); e <= Math.ceil(Math.log10(to)); e++) {
      if (mantissas.length > 1 || e % stride === 0) exponents.push(e);
    }
    return exponents
      .flatMap((e) => mantissas.map((m) => Number(`${m}e${e}`)))
      .filter((d) => d >= from && d <= to);
  }
  const exponent = Math.floor(Math.log10((to - from) / count));
  const steps = [1, 2, 5, 10].map((m) => Number(`${m}e${exponent}`));
  const ideal = Math.log((to - from) / count);
  const step = steps.reduce((a, b) =>
    Math.abs(Math.log(b) - ideal) < Math.abs(Math.log(a) - ideal) ? b : a,
  );
  const ticks: number[] = [];
  for (let i = Math.ceil(from / step - 1e-9); i * step <= to * (1 + 1e-12); i++) ticks.push(i * step);
  return ticks.map((d) => Number(d.toPrecision(10)));
}
