/** Where the plots of a stream stand: all share the same edges, so that one cursor runs through them. */
export interface PlotFrame {
  width: number;
  left: number;
  right: number;
  /** Indices at the first and last point of the view. */
  from: number;
  to: number;
}

/** The frame of charts `width` pixels wide; a doping scale takes its room at the right. */
export function plotFrame(
  width: number,
  view: { from: number; to: number },
  options: { dopingScale: boolean },
): PlotFrame {
  const narrow = width < 520;
  const left = narrow ? 46 : 58;
  return { width, left, right: options.dopingScale ? (narrow ? 46 : 58) : 10, ...view };
}

/** The pixel of an index; half a step of room stands before the first and after the last point. */
export function frameX(frame: PlotFrame, index: number): number {
  const share = (index - frame.from + 0.5) / (frame.to - frame.from + 1);
  return frame.left + share * (frame.width - frame.left - frame.right);
}

/** The index, not rounded, at a pixel: the inverse of `frameX`. */
export function frameIndex(frame: PlotFrame, x: number): number {
  const share = (x - frame.left) / (frame.width - frame.left - frame.right);
  return frame.from - 0.5 + share * (frame.to - frame.from + 1);
}
