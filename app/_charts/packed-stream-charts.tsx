'use client';

import { type ReactNode, useMemo } from 'react';
import { unpackedPoints } from './packed-points';
import { StreamCharts, type StreamChartsProps } from './stream-charts';

/** The charts of a stream from packed points: half the page's bytes, and as much less work for the server. */
export function PackedStreamCharts(
  props: Omit<StreamChartsProps, 'points'> & {
    packed: string;
    children?: ReactNode;
  },
) {
  const { packed, ...rest } = props;
  const points = useMemo(() => unpackedPoints(packed), [packed]);
  return <StreamCharts {...rest} points={points} />;
}
