import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mapLevels, stepShare } from '@/app/_charts/map-levels';
import { radialDomain } from '@/app/_charts/radial-domain';

describe('the span of a plot along the radius', () => {
  it('holds readings and a near expected with its band', () => {
    const { least, most, beyond } = radialDomain([10, 10.2], { value: 10.1, lower: 10, upper: 10.3 });
    expect(beyond).toBeNull();
    expect(least).toBeLessThan(10);
    expect(most).toBeGreaterThan(10.3);
  });

  it('never lets what is expected press the readings into a line', () => {
    expect(radialDomain([10, 10.2], { value: 20, lower: 18, upper: 22 }).beyond).toBe('above');
    expect(radialDomain([10, 10.2], { value: 2, lower: 1, upper: 3 }).beyond).toBe('below');
    const wide = radialDomain([10, 10.2], { value: 10.1, lower: 1, upper: 100 });
    expect(wide.beyond).toBeNull();
    fc.assert(
      fc.property(
        fc.double({ min: -1e3, max: 1e3, noNaN: true }),
        fc.double({ min: 0.01, max: 10, noNaN: true }),
        fc.double({ min: -1e3, max: 1e3, noNaN: true }),
        fc.double({ min: 0, max: 1e3, noNaN: true }),
        (low, size, value, half) => {
          const found = radialDomain([low, low + size], { value, lower: value - half, upper: value + half });
          expect(found.least).toBeLessThan(low);
          expect(found.most).toBeGreaterThan(low + size);
          expect(size / (found.most - found.least)).toBeGreaterThan(0.17);
          if (found.beyond === null) expect(found.least < value && value < found.most).toBe(true);
        },
      ),
      { seed: 3, numRuns: 300 },
    );
  });

  it('gives equal readings room and refuses none', () => {
    const { least, most } = radialDomain([5, 5], null);
    expect(most).toBeGreaterThan(5);
    expect(least).toBeLessThan(5);
    expect(() => radialDomain([], null)).toThrow(RangeError);
  });
});

describe('a scale of differences far from zero', () => {
  it('covers them alone, on their own side of the colours', () => {
    const over = mapLevels([16.3, 17.2], 'difference');
    expect(over.edges[0]).toBeGreaterThan(0);
    const shares = over.edges.slice(0, -1).map((_, i) => stepShare(over, i, 'difference'));
    expect(Math.min(...shares)).toBeGreaterThan(0.5);
    expect(shares.at(-1)).toBe(1);
    const under = mapLevels([-17.2, -16.3], 'difference');
    const mirrored = under.edges.slice(0, -1).map((_, i) => stepShare(under, i, 'difference'));
    expect(mirrored[0]).toBe(0);
    expect(Math.max(...mirrored)).toBeLessThan(0.5);
  });

  it('keeps zero while it leaves the pattern its steps', () => {
    expect(mapLevels([1, 2], 'difference').edges).toContain(0);
  });
});
