import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { zoomedSpan } from '@/app/_charts/zoomed-span';

const whole = { from: 0, to: 8e6 };

describe('zoomedSpan', () => {
  it('halves a span about its middle, or so that a moment stays where it stood', () => {
    expect(zoomedSpan(whole, whole, { factor: 0.5 })).toEqual({ from: 2e6, to: 6e6 });
    expect(zoomedSpan(whole, whole, { about: 2e6, factor: 0.5 })).toEqual({ from: 1e6, to: 5e6 });
  });

  it('is null once it covers the whole', () => {
    expect(zoomedSpan({ from: 2e6, to: 6e6 }, whole, { factor: 2 })).toBeNull();
    expect(zoomedSpan(whole, whole, {})).toBeNull();
  });

  it('moves by a share of its width and stops at the ends', () => {
    expect(zoomedSpan({ from: 2e6, to: 4e6 }, whole, { shift: 0.5 })).toEqual({ from: 3e6, to: 5e6 });
    expect(zoomedSpan({ from: 1e6, to: 3e6 }, whole, { shift: -2 })).toEqual({ from: 0, to: 2e6 });
  });

  it('never leaves the whole nor shrinks below a minute', () => {
    const time = fc.integer({ min: 0, max: 8e6 });
    fc.assert(
      fc.property(time, time, time, fc.double({ min: 0.01, max: 3, noNaN: true }), (a, b, about, factor) => {
        const span = zoomedSpan({ from: Math.min(a, b), to: Math.max(a, b) }, whole, { about, factor });
        if (span === null) return;
        expect(span.from).toBeGreaterThanOrEqual(0);
        expect(span.to).toBeLessThanOrEqual(8e6 + 1e-3);
        expect(span.to - span.from).toBeGreaterThanOrEqual(60_000 - 1e-3);
      }),
    );
  });

  it('refuses a factor of zero and times that are not finite', () => {
    expect(() => zoomedSpan(whole, whole, { factor: 0 })).toThrow(RangeError);
    expect(() => zoomedSpan({ from: Number.NaN, to: 1 }, whole, {})).toThrow(RangeError);
  });
});
