import { expect, it } from 'vitest';
import { packedPoints, unpackedPoints } from '@/app/_charts/packed-points';
import type { StreamChartPoint } from '@/app/_charts/stream-chart-point';

const point: StreamChartPoint = {
  id: '7',
  index: 3,
  label: 'run R0042',
  at: '2031-04-05T06:07:00.000Z',
  day: '5 Apr',
  level: 5.514,
  movingRange: null,
  within: 0,
  between: -0.25,
  completions: ['level:eight-on-one-side:below'],
  outOfSpecification: true,
  open: false,
  judged: true,
  hollow: true,
  href: '/wafers/9',
  texts: {
    level: '5.514 Ω·cm',
    at: '2031-04-05 08:07',
    expected: null,
    difference: '−1.6 %',
    dopant: '+1.8 ± 0.4 %',
    density: '1.02 × 10¹⁵ cm⁻³',
    onBefore: '−0.31 ± 0.05 %',
    movingRange: null,
    within: '0.00 %',
    between: '0.25 Ω·cm',
    notes: ['Gauge 2 · 0 of 49 sites bad'],
  },
};

it('points come out of their packing as they went in', () => {
  const flags = [false, true].flatMap((open) => [false, true].map((judged) => ({ ...point, open, judged })));
  const bare = { ...point, completions: [], outOfSpecification: false, hollow: false };
  expect(unpackedPoints(packedPoints([...flags, bare]))).toEqual([...flags, bare]);
  expect(unpackedPoints(packedPoints([]))).toEqual([]);
});

it('figures keep eight significant digits', () => {
  const [back] = unpackedPoints(packedPoints([{ ...point, level: 5.123456789012 }]));
  expect(back?.level).toBe(5.1234568);
});
