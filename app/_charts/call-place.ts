/** About what a letter of the charts' words takes at their weight, px; wide rather than narrow. */
const LETTER_PX = 6.2;

/**
 * Where the words stand that say what happened at a point of a drawing: they reach into the wider side, and lie
 * within the drawing. Null where it has no room for them: then they are left to the page.
 *
 * @example callPlace('beyond the upper limit', 300, 356) // { x: 304, anchor: 'end' }
 */
export function callPlace(
  words: string,
  pointX: number,
  width: number,
): { x: number; anchor: 'start' | 'end' } | null {
  const needed = words.length * LETTER_PX + 4;
  if (needed > width) return null;
  return pointX > width / 2
    ? { x: Math.min(Math.max(pointX + 4, needed), width - 2), anchor: 'end' }
    : { x: Math.max(Math.min(pointX - 4, width - needed), 2), anchor: 'start' };
}
