import { describe, expect, it } from 'vitest';
import { withoutStrays } from '@/app/_charts/without-strays';

const bulk = Array.from({ length: 100 }, (_, nth) => 10 + (nth % 7) / 10);

describe('the values an axis must hold', () => {
  it('leave out one that lies far from all others', () => {
    expect(withoutStrays([...bulk, 3], [])).toEqual(bulk);
    expect(withoutStrays([...bulk, 30], [])).toEqual(bulk);
  });

  it('keep what is near, what the limits reach, and what a stream does for long', () => {
    expect(withoutStrays([...bulk, 11], [])).toHaveLength(101);
    expect(withoutStrays([...bulk, 12], [9, 12.5])).toHaveLength(101);
    const shifted = Array.from({ length: 10 }, () => 30);
    expect(withoutStrays([...bulk, ...shifted], [])).toHaveLength(110);
  });

  it('are all of a few, and all where they are equal', () => {
    expect(withoutStrays([], [])).toEqual([]);
    expect(withoutStrays([1, 2, 1000], [])).toEqual([1, 2, 1000]);
    const equal = Array.from({ length: 50 }, () => 5);
    expect(withoutStrays([...equal, 6], [])).toHaveLength(51);
  });

  it('must be finite', () => {
    expect(() => withoutStrays([Number.NaN], [])).toThrow(RangeError);
  });
});
