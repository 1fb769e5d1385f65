import { describe, expect, it } from 'vitest';
import { dayTicks } from '@/app/_charts/day-ticks';

const days = (count: number, perDay: number) =>
  Array.from({ length: count }, (_, index) => ({ index, day: `${Math.floor(index / perDay) + 1} Nov` }));

describe('dayTicks', () => {
  it('labels where a day begins', () => {
    expect(dayTicks(days(6, 2), 6)).toEqual([
      { index: 0, day: '1 Nov' },
      { index: 2, day: '2 Nov' },
      { index: 4, day: '3 Nov' },
    ]);
  });

  it('labels nothing among none and the first of a single day', () => {
    expect(dayTicks([], 6)).toEqual([]);
    expect(dayTicks(days(5, 9), 6)).toEqual([{ index: 0, day: '1 Nov' }]);
  });

  it('has no more labels than there is room for', () => {
    for (const most of [1, 3, 7]) expect(dayTicks(days(90, 1), most).length).toBeLessThanOrEqual(most);
  });
});
