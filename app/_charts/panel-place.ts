'use client';

import { usePlotArea, useXAxisScale, useYAxisScale } from 'recharts';

/** Pixels of a chart's plot for the layers drawn in it. `y` keeps inside the plot, as `x` does. */
export interface PanelPlace {
  left: number;
  right: number;
  top: number;
  bottom: number;
  x: (index: number) => number;
  y: (value: number) => number;
  /** Ends of the vertical axis. */
  low: number;
  high: number;
  /** Whether a value lies within the vertical axis. */
  holds: (value: number) => boolean;
}

/** Where things stand on the chart this is called in; null while the chart has no size yet. */
export function usePanelPlace(domain: readonly [number, number]): PanelPlace | null {
  const plot = usePlotArea();
  const xScale = useXAxisScale();
  const yScale = useYAxisScale();
  if (plot === undefined || xScale === undefined || yScale === undefined) return null;
  const [left, right, top, bottom] = [plot.x, plot.x + plot.width, plot.y, plot.y + plot.height];
  const holds = (value: number) => value >= domain[0] && value <= domain[1];
  return {
    left,
    right,
    top,
    bottom,
    low: domain[0],
    high: domain[1],
    holds,
    x: (index) => Math.max(left, Math.min(right, xScale(index) ?? left)),
    y: (value) => (value < domain[0] ? bottom : value > domain[1] ? top : (yScale(value) ?? bottom)),
  };
}
