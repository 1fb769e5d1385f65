import { describe, expect, it } from 'vitest';
import { faultsOf } from '@/app/_ui/form-state';
import { newStream, typedSpecification, typedTarget } from '@/lib/streams/schema';
import { slugOf } from '@/lib/streams/slug-of';

const fields = (parsed: ReturnType<typeof typedSpecification.safeParse>) =>
  parsed.success ? [] : faultsOf(parsed.error).map(({ field }) => field);

describe('typedTarget', () => {
  const faults = (quantity: 'resistivity' | 'sheet_resistance', words: Record<string, string>) => {
    const parsed = typedTarget(quantity).safeParse({ dopant: 'boron', profile: 'uniform', ...words });
    return parsed.success ? [] : faultsOf(parsed.error);
  };

  it('takes a plain target and leaves out what was not said', () => {
    const words = { dopant: 'boron', densityPerCm3: '1e15', profile: 'uniform', backgroundDopant: '' };
    expect(typedTarget('resistivity').parse(words)).toEqual({
      quantity: 'resistivity',
      dopant: 'boron',
      densityPerCm3: 1e15,
      tolerancePercent: null,
      alongCrystal: false,
      profile: 'uniform',
      lengthUm: null,
      backgroundDopant: null,
      backgroundDensityPerCm3: null,
      calibrationFactor: null,
      calibrationPercent: null,
    });
  });

  it('refuses, beside the field, what physics cannot expect anything of', () => {
    expect(faults('resistivity', { densityPerCm3: '1e25' })[0]?.field).toBe('densityPerCm3');
    expect(
      faults('resistivity', { densityPerCm3: '1e19', profile: 'gaussian', lengthUm: '1' })[0]?.reason,
    ).toContain('no single resistivity');
    expect(faults('sheet_resistance', { densityPerCm3: '1e19', profile: 'erfc' })[0]?.field).toBe('lengthUm');
  });

  it('asks what a graded layer ends on', () => {
    const words = { densityPerCm3: '1e19', profile: 'gaussian', lengthUm: '0.5' };
    expect(faults('sheet_resistance', words)[0]?.field).toBe('backgroundDopant');
    const whole = { ...words, backgroundDopant: 'phosphorus', backgroundDensityPerCm3: '1e15' };
    expect(faults('sheet_resistance', whole)).toEqual([]);
  });

  it('lets each wafer bring its own thickness to a uniform layer', () => {
    expect(faults('sheet_resistance', { densityPerCm3: '1e16' })).toEqual([]);
  });

  it('wants a background whole, and an uncertainty with its factor', () => {
    expect(faults('resistivity', { densityPerCm3: '1e15', backgroundDopant: 'phosphorus' })[0]?.field).toBe(
      'backgroundDensityPerCm3',
    );
    expect(faults('resistivity', { densityPerCm3: '1e15', calibrationPercent: '1' })[0]?.field).toBe(
      'calibrationFactor',
    );
  });
});

describe('typedSpecification', () => {
  it('is nothing where every field is empty', () => {
    expect(typedSpecification.parse({})).toBeNull();
  });

  it('wants limits in order, and a measure with its limit', () => {
    expect(fields(typedSpecification.safeParse({ meanLower: '5', meanUpper: '4' }))).toEqual(['meanUpper']);
    expect(fields(typedSpecification.safeParse({ siteLower: '5', siteUpper: '5' }))).toEqual(['siteUpper']);
    expect(fields(typedSpecification.safeParse({ nonuniformityUpper: '3' }))).toEqual([
      'nonuniformityMetric',
    ]);
    expect(fields(typedSpecification.safeParse({ nonuniformityMetric: 'radialVariationPercent' }))).toEqual([
      'nonuniformityUpper',
    ]);
  });
});

describe('newStream', () => {
  const words = {
    name: 'N-epi',
    slug: 'n-epi',
    kind: 'epi',
    step: 'Epitaxy',
    tool: 'Reactor 1',
    chamber: '',
    recipe: 'R',
    quantity: 'resistivity',
    sitePlanId: '1',
    subgroup: 'wafer',
    subgroupSize: '1',
    controlStatistic: 'areaMean',
    chartedValue: 'statistic',
    screening: 'outliers',
    repeatabilityPercent: '0.2',
  };

  it('takes what the form sends', () => {
    expect(newStream.safeParse(words).success).toBe(true);
  });

  it('refuses a name that cannot stand in an address, and several wafers in a point that is one', () => {
    for (const slug of ['', 'N epi', '../x', '-a', 'ä']) {
      expect(newStream.safeParse({ ...words, slug }).success).toBe(false);
    }
    expect(newStream.safeParse({ ...words, subgroupSize: '3' }).success).toBe(false);
    expect(newStream.safeParse({ ...words, subgroup: 'run', subgroupSize: '3' }).success).toBe(true);
  });
});

describe('slugOf', () => {
  it('makes a name for addresses of a name for people', () => {
    expect(slugOf('N-epi 5.6 Ω·cm, Röhre 2')).toBe('n-epi-5-6-cm-ro-hre-2');
    expect(slugOf('  ')).toBe('');
  });
});
