import type { Target } from '@/lib/physics/target';

const FURTHER = [
  'counterDopant',
  'counterDensityPerCm3',
  'rangeUm',
  'driveInC',
  'driveInMin',
  'pairs',
  'temperatureCoefficientPercentPerC',
  'method',
] as const satisfies readonly (keyof Target)[];

type Further = Pick<Target, (typeof FURTHER)[number]>;

/** What only some targets say, nothing of it where it was not said: so a plain target stays plain. */
export function furtherTarget(from: Required<Further>): Further {
  return Object.fromEntries(FURTHER.filter((name) => from[name] !== null).map((name) => [name, from[name]]));
}
