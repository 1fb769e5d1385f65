import { describe, expect, it } from 'vitest';
import { hasRoom } from '@/lib/control/has-room';
import { limitSet } from '@/lib/control/limit-set';

const of = (levels: readonly number[]) =>
  limitSet(levels.map((level) => ({ level, within: null, between: null, wafers: 1 })));

describe('room about the centre line', () => {
  it('is there as soon as levels vary, and not where they are equal or differ in their last bit', () => {
    expect(hasRoom(of([1, 2]))).toBe(true);
    expect(hasRoom(of([1, 1, 1]))).toBe(false);
    expect(hasRoom(of([10, 10, 10, 10, 10, 10, 10 + 2 ** -49]))).toBe(false);
  });
});
