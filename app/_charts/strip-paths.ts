import { oneDecimal } from './drawing';
import type { Strip, StripMark } from './strip-marks';

/** The marks and segments of a strip, each kind as the `d` of one path; empty where there are none. */
export interface StripPaths {
  lines: string;
  /** Zero-length strokes: drawn with round ends they are dots. */
  dots: string;
  rings: string;
  diamonds: string;
  crosses: string;
  /** Arrowheads over and under the levels that lie outside the drawing. */
  beyond: string;
}

const HALF_DIAMOND = 4.4;
const CROSS_ARM = 2.8;

/**
 * A strip as six paths instead of an element for every mark: a board of 40 rows is drawn by the server in a third of
 * the time so.
 *
 * @example stripPaths({ marks: [{ x: 5, y: 9, shape: 'dot', beyond: false }], lines: [] }, 30).dots // 'M5 9h0'
 */
export function stripPaths({ marks, lines }: Strip, height: number): StripPaths {
  const of = (shape: StripMark['shape'], draw: (mark: StripMark) => string) =>
    marks
      .filter((mark) => mark.shape === shape)
      .map(draw)
      .join('');
  const point = ({ x, y }: StripMark) => `M${x} ${y}h0`;
  const h = HALF_DIAMOND;
  const a = CROSS_ARM;
  return {
    lines: lines.map((line) => `M${line}`).join(''),
    dots: of('dot', point),
    rings: of('ring', point),
    diamonds: of('diamond', ({ x, y }) => `M${x} ${oneDecimal(y - h)}l${h} ${h}l-${h} ${h}l-${h}-${h}z`),
    crosses: of(
      'cross',
      ({ x, y }) =>
        `M${oneDecimal(x - a)} ${oneDecimal(y - a)}l${2 * a} ${2 * a}m0-${2 * a}l-${2 * a} ${2 * a}`,
    ),
    beyond: marks
      .filter((mark) => mark.beyond)
      .map(({ x, y }) =>
        y < height / 2
          ? `M${oneDecimal(x - 4)} ${oneDecimal(y - 5)}l4-4l4 4`
          : `M${oneDecimal(x - 4)} ${oneDecimal(y + 5)}l4 4l4-4`,
      )
      .join(''),
  };
}
