import { describe, expect, it } from 'vitest';
import { axisTicks } from '@/app/_charts/axis-ticks';

describe('axisTicks', () => {
  it('gives round values with as many decimals as the step needs', () => {
    expect(axisTicks([0, 1], 2)).toEqual([
      { value: 0, text: '0.0' },
      { value: 0.5, text: '0.5' },
      { value: 1, text: '1.0' },
    ]);
    expect(axisTicks([5.46, 5.66], 2).map((tick) => tick.text)).toEqual(['5.5', '5.6']);
  });

  it('writes a true minus sign', () => {
    expect(axisTicks([-1, 1], 2)[0]?.text).toBe('−1');
  });

  it('refuses a range of no width', () => {
    expect(() => axisTicks([1, 1], 3)).toThrow(RangeError);
  });
});
