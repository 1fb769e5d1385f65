import { scaleLinear, scaleLog } from 'd3-scale';
import { axisTicks } from './axis-ticks';

/** One axis of a drawing of curves. */
export interface PlotAxis {
  /** What it counts, with unit: "resistivity, Ω·cm". */
  label: string;
  domain: readonly [number, number];
  isLog: boolean;
}

/** An axis laid out over pixels: a place for each value, and the values that are labelled. */
export interface LaidAxis {
  place: (value: number) => number;
  ticks: { value: number; text: string }[];
}

/**
 * Lays an axis over `range` pixels: even numbers on a straight one, on a logarithmic one the decades, thinned to about
 * `count`. Throws RangeError for a domain without width, and a logarithmic one that is not positive.
 */
export function plotAxis(axis: PlotAxis, range: readonly [number, number], count: number): LaidAxis {
  const [low, high] = axis.domain;
  if (!axis.isLog) {
    const ticks = axisTicks([low, high], count);
    return { place: scaleLinear([low, high], [...range]), ticks };
  }
  if (!(low > 0 && high > low && Number.isFinite(high))) {
    throw new RangeError(`A logarithmic axis runs from above 0 upwards, not ${low} to ${high}.`);
  }
  const [first, last] = [Math.ceil(Math.log10(low) - 1e-9), Math.floor(Math.log10(high) + 1e-9)];
  const stride = Math.max(1, Math.ceil((last - first + 1) / count));
  const ticks: LaidAxis['ticks'] = [];
  for (let exponent = first; exponent <= last; exponent += 1) {
    if ((exponent - first) % stride === 0) ticks.push({ value: 10 ** exponent, text: powerOfTen(exponent) });
  }
  return { place: scaleLog([low, high], [...range]), ticks };
}

function powerOfTen(exponent: number): string {
  if (exponent >= -2 && exponent <= 3) return String(Number(`1e${exponent}`));
  const digits = String(exponent).replace(/[-\d]/g, (c) =>
    c === '-' ? '⁻' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.charAt(Number(c)),
  );
  return `10${digits}`;
}
