import { describe, expect, it } from 'vitest';
import { faultsOf } from '@/app/_ui/form-state';
import { baselineSpan, inheritedLimits } from '@/lib/limits/schema';

const meta = { effectiveFrom: '2031-01-05T06:07', reason: 'from the sheet' };
const given = (words: Record<string, string>) => inheritedLimits('UTC', 3).safeParse({ ...meta, ...words });
const faults = (words: Record<string, string>) => {
  const parsed = given(words);
  return parsed.success ? [] : faultsOf(parsed.error).map(({ field }) => field);
};
const level = { lower: '20', centre: '24', upper: '28' };

describe('inherited limits', () => {
  it('take σ from the limits and the moving range from σ', () => {
    const limits = given(level).data?.limits;
    expect(limits?.n).toBe(0);
    expect(limits?.level.sigma).toBeCloseTo(8 / 6, 12);
    // Mean moving range 1.128·σ, upper limit by probability 3.760 times that, 3√2·σ.
    expect(limits?.movingRange.centre).toBeCloseTo((1.128379 * 8) / 6, 5);
    expect(limits?.movingRange.upper).toBeCloseTo((3 * Math.SQRT2 * 8) / 6, 9);
    expect(limits?.within).toBeNull();
    expect(limits?.between).toBeNull();
  });

  it('keep what was given beside the level', () => {
    const limits = given({
      ...level,
      subgroups: '60',
      movingRangeUpper: '5',
      withinLower: '0.5',
      withinCentre: '1',
      withinUpper: '2',
      betweenCentre: '0.3',
      betweenUpper: '0.9',
    }).data?.limits;
    expect(limits?.n).toBe(60);
    expect(limits?.movingRange.upper).toBe(5);
    expect(limits?.within?.logMean).toBe(0);
    expect(limits?.within?.logSigma).toBeCloseTo(Math.log(4) / 6, 12);
    expect(limits?.between).toEqual({ centre: 0.3, upper: 0.9, wafers: 3 });
  });

  it('are refused where the zones would not be equal, out of order or half given', () => {
    expect(faults({ ...level, centre: '25' })).toEqual(['centre']);
    expect(faults({ ...level, centre: '30' })).toEqual(['centre']);
    expect(faults({ ...level, upper: '10' })).toEqual(['upper']);
    expect(faults({ ...level, withinUpper: '2' })).toEqual(['withinCentre']);
    expect(faults({ ...level, withinLower: '2', withinCentre: '1', withinUpper: '3' })).toEqual([
      'withinCentre',
    ]);
    expect(faults({ ...level, betweenCentre: '2' })).toEqual(['betweenUpper']);
  });
});

describe('baselineSpan', () => {
  it('holds its last minute whole', () => {
    const span = baselineSpan('UTC').parse({ from: '2031-01-05T06:07', to: '2031-01-05T06:07' });
    expect(span.from.toISOString()).toBe('2031-01-05T06:07:00.000Z');
    expect(span.to.toISOString()).toBe('2031-01-05T06:07:59.999Z');
  });
});
