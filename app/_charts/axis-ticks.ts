import { scaleLinear } from 'd3-scale';

/**
 * Round values along an axis, about `count` of them, each with its text: as many decimals as the step needs,
 * a true minus sign.
 *
 * @example axisTicks([0, 1], 2) // [{ value: 0, text: '0.0' }, { value: 0.5, text: '0.5' }, { value: 1, text: '1.0' }]
 */
export function axisTicks(
  domain: readonly [number, number],
  count: number,
): { value: number; text: string }[] {
  if (!domain.every(Number.isFinite) || domain[0] >= domain[1]) {
    throw new RangeError('An axis needs a finite range of some width');
  }
  const scale = scaleLinear().domain([...domain]);
  const text = scale.tickFormat(count);
  return scale.ticks(count).map((value) => ({ value, text: text(value) }));
}
