import { describe, expect, it } from 'vitest';
import { faultsOf } from '@/app/_ui/form-state';
import { newStream, newStreamEvent, typedSpecification } from '@/lib/streams/schema';
import { slugOf } from '@/lib/streams/slug-of';

const fields = (parsed: ReturnType<typeof typedSpecification.safeParse>) =>
  parsed.success ? [] : faultsOf(parsed.error).map(({ field }) => field);

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

describe('newStreamEvent', () => {
  const event = (at: string) =>
    newStreamEvent('UTC').safeParse({ kind: 'adjustment', at, text: 'Dose factor 0.985' });
  const minutes = (count: number) => new Date(Date.now() + count * 60_000).toISOString().slice(0, 16);

  it('takes what was done until now, and refuses a time that lies ahead: nothing takes an event back', () => {
    expect(event('2026-01-06T03:30').success).toBe(true);
    expect(event(minutes(0)).success).toBe(true);
    expect(event(minutes(10)).error?.issues[0]?.message).toMatch(/^This time lies ahead/);
    expect(event('').error?.issues[0]?.message).toBe('Give a day and a time.');
  });
});
