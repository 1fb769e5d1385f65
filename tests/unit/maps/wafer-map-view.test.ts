import { describe, expect, it } from 'vitest';
import { readingUnit } from '@/lib/maps/reading-unit';
import { mapViewOf, mapViewValues } from '@/lib/maps/wafer-map-view';
import { specificationVerdicts } from '@/lib/maps/specification-verdicts';
import { NO_FIGURES } from '@/lib/wafer/wafer-figures';

const study = {
  values: [10, 11, null],
  statistic: 10,
  meanOfSites: 10.5,
  against: { expected: { value: 8 } } as never,
  usual: { wafers: 9, ratios: [1, null, 1], shapes: [] },
};

describe('a view of a wafer’s map', () => {
  it('comes from the address, and is the readings for anything strange', () => {
    expect(mapViewOf('usual')).toBe('usual');
    expect(['', 'Value', undefined, ['mean']].map(mapViewOf)).toEqual(['value', 'value', 'value', 'value']);
  });

  it('shows readings in the page’s unit, and gaps as gaps', () => {
    expect(mapViewValues('value', study, 1000)).toEqual({ values: [0.01, 0.011, null] });
  });

  it('takes differences in percent from mean, expected and usual', () => {
    const values = (view: 'mean' | 'expected' | 'usual') =>
      (mapViewValues(view, study, 1) as { values: (number | null)[] }).values;
    expect(values('mean')[1]).toBeCloseTo(10, 12);
    expect(values('expected')[0]).toBeCloseTo(25, 12);
    expect(values('usual')[0]).toBeCloseTo(100 * (10 / 10.5 - 1), 12);
    expect(values('usual').slice(1)).toEqual([null, null]);
  });

  it('says what is missing for a view that cannot be drawn', () => {
    expect(mapViewValues('expected', { ...study, against: null }, 1)).toEqual({ gap: 'nothing-expected' });
    expect(mapViewValues('usual', { ...study, usual: null }, 1)).toEqual({ gap: 'no-habit' });
    expect(mapViewValues('mean', { ...study, statistic: null }, 1)).toEqual({ gap: 'no-reading' });
    expect(mapViewValues('value', { ...study, statistic: null }, 1)).toHaveProperty('values');
  });
});

describe('the unit of a page', () => {
  it('is the one people say for readings of that size', () => {
    expect(readingUnit('sheet_resistance', 1701)).toEqual({ unit: 'kΩ/□', scale: 1000 });
    expect(readingUnit('resistivity', 0.012)).toEqual({ unit: 'mΩ·cm', scale: 1e-3 });
    expect(readingUnit('resistivity', 1)).toEqual({ unit: 'Ω·cm', scale: 1 });
    expect(readingUnit('resistivity', null)).toEqual({ unit: 'Ω·cm', scale: 1 });
    expect(readingUnit('resistivity', 0).scale).toBe(1);
  });
});

describe('a specification point by point', () => {
  const specification = {
    meanLower: 9,
    meanUpper: 11,
    siteLower: 8,
    siteUpper: null,
    nonuniformityMetric: 'relativeStandardDeviationPercent' as const,
    nonuniformityUpper: 2,
  };
  const figures = { ...NO_FIGURES, areaMean: 8.5, minimum: { value: 7, siteIndex: 0 } };

  it('gives the verdicts on record, and only what is specified', () => {
    const found = specificationVerdicts(specification, figures, 'areaMean', [
      'wafer-mean:below',
      'site:below',
    ]);
    expect(found.map(({ verdict }) => verdict)).toEqual(['below', 'below', 'inside']);
    expect(found.map(({ name }) => name)).not.toContain('highest reading');
  });

  it('judges nothing of a wafer that is not judged', () => {
    const found = specificationVerdicts(specification, figures, 'areaMean', null);
    expect(new Set(found.map(({ verdict }) => verdict))).toEqual(new Set(['not judged']));
  });
});
