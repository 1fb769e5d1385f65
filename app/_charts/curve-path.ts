import { oneDecimal } from './drawing';

export interface PlotPoint {
  x: number;
  y: number;
}

/**
 * The path of straight segments through points, each placed by its axis. Points that are no numbers part it: nothing is
 * drawn where nothing is known.
 *
 * @example curvePath([{ x: 0, y: 0 }, { x: 1, y: 2 }], (x) => 10 * x, (y) => y) // 'M0 0L10 2'
 */
export function curvePath(
  points: readonly (PlotPoint | null)[],
  placeX: (value: number) => number,
  placeY: (value: number) => number,
): string {
  let d = '';
  let isDown = false;
  for (const point of points) {
    const [x, y] = point === null ? [NaN, NaN] : [placeX(point.x), placeY(point.y)];
    if (!Number.isFinite(x) || !Number.isFinite(y)) {
      isDown = false;
      continue;
    }
    d += `${isDown ? 'L' : 'M'}${oneDecimal(x)} ${oneDecimal(y)}`;
    isDown = true;
  }
  return d;
}
