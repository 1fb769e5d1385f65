import { describe, expect, it } from 'vitest';
import { measuredWafer, measuringStream } from '@/lib/maps/measured-wafer';
import { readFacts } from '@/lib/maps/read-facts';
import type { RawMap } from '@/lib/maps/raw-maps';
import { sentContent } from '@/lib/maps/sent-content';
import { correctedBy, valuesAt23C } from '@/lib/maps/values-at-23c';
import { subgroupKey } from '@/lib/maps/wafer-rows';
import { targetCoefficientPercentPerC } from '@/lib/physics/value-at-temperature';
import { GAUSSIAN } from '../physics/targets';
import { plan, settings } from './demo-settings';

const factsOf = (words: RawMap['words'] = {}) =>
  readFacts({ wafer: 'W1', measured_at: '2031-04-05T06:07:08Z', ...words }, {}).facts;
const even = plan.sites.map(() => 13.5);
const measured = (own = settings(), readings: (number | null)[] = even, words: RawMap['words'] = {}) =>
  measuredWafer(measuringStream(own), factsOf(words), readings);

describe('valuesAt23C', () => {
  const boron = settings().targets[0]!.target;
  const uncorrected = { correctionsApplied: ['thickness', 'geometry', 'spacing'], temperatureC: 25 };

  it('leaves readings as sent where the sender corrected them', () => {
    const readings = [1, null, -2];
    expect(valuesAt23C(readings, { correctionsApplied: ['temperature'], temperatureC: 25 }, boron, {})).toBe(
      readings,
    );
  });

  it('brings each possible reading to 23 °C (ASTM F84: 10 Ω·cm p-type at 25 °C is 9.835)', () => {
    const [a, b, c, d] = valuesAt23C([10, null, -2, 0], uncorrected, boron, {});
    expect(a).toBeCloseTo(9.835, 3);
    expect([b, c, d]).toEqual([null, -2, 0]);
    expect(valuesAt23C([10], { ...uncorrected, temperatureC: 23 }, boron, {})).toEqual([10]);
  });

  it('brings a layer to 23 °C by its own profile, not as silicon of that many Ω·cm', () => {
    // p-type silicon of 170 Ω·cm would have 0.88 % per °C (ASTM F84); its depths are far heavier.
    const [value = 0] = valuesAt23C([170], uncorrected, GAUSSIAN, {});
    expect(100 * (1 - (value ?? 0) / 170)).toBeCloseTo(2 * targetCoefficientPercentPerC(GAUSSIAN), 9);
    expect(targetCoefficientPercentPerC(GAUSSIAN)).toBeLessThan(0.2);
    const own = { ...GAUSSIAN, temperatureCoefficientPercentPerC: 0.2 };
    expect(valuesAt23C([100, null, -1], uncorrected, own, {})).toEqual([expect.closeTo(99.6, 9), null, -1]);
  });

  it('knows no correction without a target', () => {
    expect(valuesAt23C([10], uncorrected, null, {})).toEqual([null]);
  });

  it('has no value for a reading beyond the method, and says who corrected what', () => {
    expect(valuesAt23C([600], uncorrected, boron, {})).toEqual([null]);
    expect(correctedBy(['temperature', 'spacing'])).toBe('all as sent');
    expect(correctedBy([])).toContain('ASTM F84');
  });
});

describe('measuredWafer', () => {
  it('charts the statistic of the stream, or its deviation from what physics expects', () => {
    expect(measured().level).toBeCloseTo(13.5, 12);
    const relative = measured(settings({ chartedValue: 'relative' }));
    expect(relative.level).toBeCloseTo(100 * Math.log(13.5 / relative.expected!.value), 12);
    expect(relative.within).toBe(0);
  });

  it('does not judge a wafer that cannot be compared, or with too few good readings, and says why', () => {
    const crystal = settings({ chartedValue: 'relative' }, { target: { alongCrystal: true } });
    expect(measured(crystal)).toMatchObject({ level: null, within: null, expected: null });
    expect(measured(crystal).notJudgedReason).toContain('along the crystal');
    expect(measured(crystal, even, { ingot_fraction: '0.5' }).notJudgedReason).toBeNull();
    expect(measured(settings({ chartedValue: 'relative' }, { target: null })).notJudgedReason).toContain(
      'no target',
    );
    const few = measured(settings(), [13.5, 13.5, null, null, null, 13.5, 13.5, 13.5, 13.5]);
    expect(few).toMatchObject({
      level: null,
      specification: [],
      notJudgedReason: expect.stringContaining('6 of 9'),
    });
  });

  it('names each way out of specification; at the limit is within', () => {
    const specification = { meanLower: 13.5, meanUpper: 14, siteUpper: 13.5 };
    expect(measured(settings({}, { specification })).specification).toEqual([]);
    const high = even.map((value, i) => value + (i === 8 ? 9 : 0.6));
    expect(measured(settings({}, { specification }), high).specification).toEqual([
      'wafer-mean:above',
      'site:above',
    ]);
    const evenness = {
      nonuniformityMetric: 'halfRangeOverMeanPercent',
      nonuniformityUpper: 1,
      siteLower: 20,
    } as const;
    expect(measured(settings({}, { specification: evenness }), high).specification).toEqual([
      'site:below',
      'nonuniformity:above',
    ]);
    expect(measured(settings({}, { specification: { meanLower: 14, meanUpper: 15 } })).specification).toEqual(
      ['wafer-mean:below'],
    );
  });

  it('holds a wafer against specification even where nothing is expected of it', () => {
    const specification = { meanLower: 14, meanUpper: 15 };
    const crystal = settings({ chartedValue: 'relative' }, { target: { alongCrystal: true }, specification });
    expect(measured(crystal)).toMatchObject({ level: null, specification: ['wafer-mean:below'] });
    expect(measured(crystal, [null, null, ...even.slice(2)]).specification).toEqual([]);
  });
});

describe('what was sent', () => {
  const measurement = (words: RawMap['words'] = {}, readings: (number | null)[] = [1, null, 2.5]) => ({
    streamId: '7',
    facts: factsOf(words),
    readings,
  });

  it('has a digest that every fact and reading decides, and the notation does not', () => {
    const { hash, readings } = sentContent(measurement());
    expect(readings).toBe('{1,NULL,2.5}');
    expect(sentContent(measurement({ measured_at: '2031-04-05T08:07:08+02:00' })).hash).toBe(hash);
    const others = [
      measurement({ wafer: 'W2' }),
      measurement({ note: 'n' }),
      measurement({ gauge: 'n' }),
      measurement({ temperature_c: '23' }),
      measurement({ lot: 'L' }),
      measurement({ run: 'L' }),
      measurement({}, [1, 2.5, null]),
      measurement({}, [1, null, 2.5000000001]),
    ];
    expect(new Set([hash, ...others.map((other) => sentContent(other).hash)]).size).toBe(1 + others.length);
  });

  it('belongs to the subgroup that the stream counts', () => {
    const facts = factsOf({ run: 'R1', lot: 'L1' });
    expect(subgroupKey('wafer', facts)).toBe('R1/W1/2031-04-05T06:07:08.000Z');
    expect(subgroupKey('wafer', factsOf())).toBe('/W1/2031-04-05T06:07:08.000Z');
    expect(['run', 'lot', 'ingot'].map((kind) => subgroupKey(kind as 'run', facts))).toEqual([
      'R1',
      'L1',
      'L1',
    ]);
  });
});
