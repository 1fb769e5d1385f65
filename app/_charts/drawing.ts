/** One path of a small drawing. */
export interface DrawnPath {
  /** Empty: nothing is drawn. */
  d: string;
  className: string | undefined;
}

/** All that the `d` of a path may hold: nothing that could be markup. */
const PATH = /^[MmLlHhVvZzAa0-9 .,eE-]*$/;

/**
 * Paths as the inner markup of one `svg`. The server makes and sends each element of a page twice, as HTML and as
 * data for the browser; a board of 40 rows with three drawings each is half as much work when a drawing is one text.
 *
 * @throws RangeError for a `d` that is no path.
 * @example drawing([{ d: 'M0 0h5', className: 'line' }]).__html // '<path d="M0 0h5" class="line"/>'
 */
export function drawing(paths: readonly (DrawnPath | null)[]): { __html: string } {
  let markup = '';
  for (const path of paths) {
    if (path === null || path.d === '') continue;
    if (!PATH.test(path.d)) throw new RangeError('This is no path');
    markup += `<path d="${path.d}" class="${path.className ?? ''}"/>`;
  }
  return { __html: markup };
}

export const oneDecimal = (value: number): number => Math.round(value * 10) / 10;
