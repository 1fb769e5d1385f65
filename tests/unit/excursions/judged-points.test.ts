import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { limitsInForce } from '@/lib/excursions/judged-points';
import { revision } from './streams';

describe('the limits in force', () => {
  it('are none before the first revision takes effect, and at that very instant', () => {
    expect(limitsInForce([], 10)).toBeNull();
    expect(limitsInForce([revision(1, 10)], 9)).toBeNull();
    expect(limitsInForce([revision(1, 10)], 10)).toBeNull();
    expect(limitsInForce([revision(1, 10)], 11)?.revision).toBe(1);
  });

  it('are those that took effect last, whatever their number', () => {
    const limits = [revision(1, 0), revision(2, 50), revision(3, 20)];
    expect([10, 20, 21, 50, 51].map((at) => limitsInForce(limits, at)?.revision)).toEqual([1, 1, 3, 3, 2]);
  });

  it('are never a provisional revision from the instant on at which another approved since takes force', () => {
    const provisional = { ...revision(2, 50), supersededFrom: 20 };
    const limits = [revision(1, 0), provisional, revision(3, 20)];
    expect([10, 20, 21, 50, 51, 99].map((at) => limitsInForce(limits, at)?.revision)).toEqual([
      1, 1, 3, 3, 3, 3,
    ]);
    const gaveWayLater = [{ ...revision(1, 0), supersededFrom: 60 }, revision(2, 60)];
    expect([1, 60, 61].map((at) => limitsInForce(gaveWayLater, at)?.revision)).toEqual([1, 1, 2]);
    const dates = limits.map((one) => ({
      ...one,
      effectiveFrom: new Date(one.effectiveFrom),
      supersededFrom: one.supersededFrom === null ? null : new Date(one.supersededFrom),
    }));
    expect(limitsInForce(dates, 60)?.revision).toBe(3);
  });

  it('are the higher revision of two that took effect together, in whatever order they come', () => {
    const tied = fc.shuffledSubarray([1, 2, 3, 4], { minLength: 4 });
    fc.assert(
      fc.property(tied, (numbers) => {
        const limits = numbers.map((number) => revision(number, number < 3 ? 5 : 7));
        expect(limitsInForce(limits, 6)?.revision).toBe(2);
        expect(limitsInForce(limits, 8)?.revision).toBe(4);
      }),
    );
  });
});
