import { describe, expect, it } from 'vitest';
import { drawnPoints } from '@/app/(line)/streams/[slug]/drawn-points';
import { spanPoint } from './fixtures';

const stretch = (count: number) =>
  Array.from({ length: count }, (_, nth) => spanPoint(nth, { level: 10 + Math.sin(nth) }));

describe('the points drawn of a stretch', () => {
  it('are all of them, each with its place, as long as they are few', () => {
    expect(drawnPoints(stretch(3), null).map((point) => point.index)).toEqual([0, 1, 2]);
    expect(drawnPoints([], null)).toEqual([]);
  });

  it('are at most 600 of many, with every extreme and the selected one', () => {
    const points = stretch(20_000);
    points[777] = spanPoint(777, { level: 99 });
    points[778] = spanPoint(778, { level: -99 });
    const drawn = drawnPoints(points, '12346');
    expect(drawn.length).toBeLessThanOrEqual(600);
    const kept = new Set(drawn.map((point) => point.index));
    for (const place of [0, 777, 778, 12_345, 19_999]) expect(kept).toContain(place);
  });

  it('keep every signal where it begins and ends, not each subgroup of a long run', () => {
    const points = stretch(5000).map((point, nth) =>
      nth >= 1000 && nth < 4000 ? { ...point, completions: ['level:eight-on-one-side:below'] } : point,
    );
    points[4500] = spanPoint(4500, { completions: ['level:beyond-3-sigma:above'] });
    const drawn = drawnPoints(points, null);
    expect(drawn.length).toBeLessThanOrEqual(600);
    const kept = new Set(drawn.map((point) => point.index));
    for (const place of [1000, 3999, 4500]) expect(kept).toContain(place);
    expect(drawn.find((point) => point.index === 1000)?.completions).toHaveLength(1);
  });
});
