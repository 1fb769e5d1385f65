import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { frameIndex, frameX, plotFrame } from '@/app/_charts/plot-frame';

describe('plotFrame', () => {
  it('leaves room for a doping scale at the right, less on a narrow screen', () => {
    const view = { from: 0, to: 9 };
    expect(plotFrame(1000, view, { dopingScale: true }).right).toBe(58);
    expect(plotFrame(358, view, { dopingScale: true }).right).toBe(46);
    expect(plotFrame(1000, view, { dopingScale: false }).right).toBe(10);
  });

  it('stands a single point in the middle', () => {
    const frame = plotFrame(1000, { from: 7, to: 7 }, { dopingScale: true });
    expect(frameX(frame, 7)).toBe(500);
  });

  it('keeps half a step of room at both ends', () => {
    const frame = { width: 120, left: 10, right: 10, from: 0, to: 9 };
    expect([frameX(frame, 0), frameX(frame, 9)]).toEqual([15, 105]);
  });

  it('finds the index back from its pixel', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 300, max: 2000 }),
        fc.nat(9999),
        fc.nat(5000),
        fc.nat(5000),
        (width, from, n, k) => {
          const frame = plotFrame(width, { from, to: from + n }, { dopingScale: true });
          const index = from + Math.min(n, k);
          expect(frameIndex(frame, frameX(frame, index))).toBeCloseTo(index, 6);
        },
      ),
    );
  });
});
