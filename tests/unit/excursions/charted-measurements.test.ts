import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chartedMeasurements, type MeasuredOnce } from '@/lib/excursions/charted-measurements';

const one = (measuredAt: number, processedAt: number, judgeable = true): MeasuredOnce => ({
  measuredAt,
  processedAt,
  judgeable,
});

/** When those that are charted were measured. */
const charted = (measurements: readonly MeasuredOnce[]) =>
  [...chartedMeasurements(measurements)].map(({ measuredAt }) => measuredAt).sort((a, b) => a - b);

describe('of the measurements of one wafer there is charted', () => {
  it('the first of each time it was processed', () => {
    expect(charted([one(12, 10), one(15, 10), one(22, 20), one(19, 10)])).toEqual([12, 22]);
  });

  it('the first that can be judged, and the first where none can', () => {
    expect(charted([one(12, 10, false), one(15, 10), one(16, 10)])).toEqual([15]);
    expect(charted([one(12, 10, false), one(15, 10, false)])).toEqual([12]);
  });

  it('the first, where they bring no time of processing of their own', () => {
    expect(charted([one(12, 12), one(15, 15), one(19, 19)])).toEqual([12]);
    expect(charted([one(12, 10), one(15, 15)])).toEqual([12]);
    expect(charted([one(12, 10), one(22, 20), one(25, 25)])).toEqual([12, 22]);
  });

  it('the same whatever their order', () => {
    const measurements = fc.uniqueArray(
      fc.record({ measuredAt: fc.nat(30), lag: fc.constantFrom(0, 0, 1, 5), judgeable: fc.boolean() }),
      { selector: ({ measuredAt }) => measuredAt, minLength: 1, maxLength: 8 },
    );
    fc.assert(
      fc.property(measurements, fc.nat(), (list, turn) => {
        const all = list.map(({ measuredAt, lag, judgeable }) =>
          one(measuredAt, measuredAt - lag, judgeable),
        );
        const cut = turn % all.length;
        expect(charted([...all.slice(cut), ...all.slice(0, cut)].reverse())).toEqual(charted(all));
      }),
    );
  });
});
