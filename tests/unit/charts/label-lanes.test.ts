import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { labelLanes } from '@/app/_charts/label-lanes';

describe('labelLanes', () => {
  it('places none and one', () => {
    expect(labelLanes([], { lanes: 2, right: 100 })).toEqual([]);
    expect(labelLanes([{ x: 10, width: 20 }], { lanes: 2, right: 100 })).toEqual([{ x: 10, lane: 0 }]);
  });

  it('puts a label that would cover another in the next lane, and leaves out what has no room', () => {
    const label = { x: 10, width: 50 };
    const lanes = labelLanes([label, label, label], { lanes: 2, right: 100 }).map((one) => one.lane);
    expect(lanes).toEqual([0, 1, null]);
  });

  it('moves a label left that would run over the end', () => {
    expect(labelLanes([{ x: 90, width: 30 }], { lanes: 1, right: 100 })[0]).toEqual({ x: 70, lane: 0 });
  });

  it('never lets two labels of a lane overlap', () => {
    const labels = fc.array(fc.record({ x: fc.nat(500), width: fc.nat(80) }), { maxLength: 30 });
    fc.assert(
      fc.property(labels, (some) => {
        const placed = labelLanes(some, { lanes: 3, right: 500 });
        placed.forEach((one, at) =>
          placed.forEach((other, otherAt) => {
            if (at === otherAt || one.lane === null || one.lane !== other.lane || one.x > other.x) return;
            if (one.x === other.x && at > otherAt) return;
            expect(one.x + (some[at]?.width ?? 0)).toBeLessThanOrEqual(other.x);
          }),
        );
      }),
    );
  });
});
