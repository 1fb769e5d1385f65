import { describe, expect, it } from 'vitest';
import { readFacts } from '@/lib/maps/read-facts';
import { readNumber } from '@/lib/maps/read-number';
import type { RawMap } from '@/lib/maps/raw-maps';

const least = { wafer: 'W1', measured_at: '2031-04-05T06:07:08Z' };
const faultOf = (words: RawMap['words']) => {
  const { faults } = readFacts({ ...least, ...words }, {});
  expect(faults.length).toBeLessThan(2);
  return faults[0] ?? null;
};
const instant = (text: string) =>
  readFacts({ ...least, measured_at: text }, {}).facts.measuredAt.toISOString();

describe('readNumber', () => {
  it('takes decimal notation with a point, signs, exponents and spaces around', () => {
    for (const [text, value] of [
      ['1', 1],
      ['-1.5', -1.5],
      ['+.5', 0.5],
      ['1.', 1],
      [' 1e3 ', 1000],
      ['2.5E-3', 0.0025],
      ['1e-400', 0],
      ['007', 7],
    ] as const)
      expect(readNumber(text)).toBe(value);
  });

  it('takes nothing for null and all else for NaN', () => {
    expect(readNumber('')).toBeNull();
    expect(readNumber('  ')).toBeNull();
    for (const text of [
      '1,5',
      '1 000',
      '0x10',
      'NaN',
      'Infinity',
      '1e999',
      '1e200',
      '.',
      'e5',
      '--1',
      '1.2.3',
      '٣',
    ])
      expect(readNumber(text)).toBeNaN();
  });
});

describe('readFacts', () => {
  it('reads every word of a wafer', () => {
    const { facts, diameterMm, faults } = readFacts(
      {
        lot: 'L1',
        run: 'R1',
        wafer: 'W1',
        slot: '3',
        measured_at: '2031-04-05T06:07:08.250+02:00',
        processed_at: '2031-04-04 23:00-01:00',
        stage: 'post',
        tool: 'T',
        chamber: 'C',
        recipe: 'P',
        gauge: 'G',
        operator: 'O',
        temperature_c: '22.5',
        thickness_um: '525',
        diameter_mm: '200.0',
        ingot_fraction: '.25',
        corrections_applied: 'thickness;geometry, spacing',
        note: 'n',
      },
      { lot: 'not this' },
    );
    expect(faults).toEqual([]);
    expect(diameterMm).toBe(200);
    expect(facts).toEqual({
      lot: 'L1',
      run: 'R1',
      wafer: 'W1',
      slot: 3,
      measuredAt: new Date('2031-04-05T04:07:08.250Z'),
      processedAt: new Date('2031-04-05T00:00:00Z'),
      stage: 'post',
      tool: 'T',
      chamber: 'C',
      recipe: 'P',
      gauge: 'G',
      operator: 'O',
      temperatureC: 22.5,
      thicknessUm: 525,
      ingotFraction: 0.25,
      correctionsApplied: ['thickness', 'geometry', 'spacing'],
      note: 'n',
    });
  });

  it('lets the caller say what the file does not, and takes the time of measurement for that of processing', () => {
    const { facts } = readFacts(
      { wafer: '', lot: 'L1', measured_at: least.measured_at },
      { wafer: 'W9', lot: 'L2' },
    );
    expect([facts.wafer, facts.lot]).toEqual(['W9', 'L1']);
    expect(facts.processedAt).toEqual(facts.measuredAt);
  });

  it('refuses a time without an offset and says how to write it', () => {
    for (const text of ['2031-04-05T06:07:08', '2031-04-05 06:07', '2031-04-05'])
      expect(faultOf({ measured_at: text })).toEqual({
        column: 'measured_at',
        reason: expect.stringContaining('has no offset from UTC'),
      });
    expect(faultOf({ processed_at: '2031-04-05T06:07' })?.column).toBe('processed_at');
  });

  it('reads offsets with and without a colon, minutes without seconds', () => {
    expect(instant('2031-04-05T06:07:08+0530')).toBe('2031-04-05T00:37:08.000Z');
    expect(instant('2031-04-05T06:07-03:00')).toBe('2031-04-05T09:07:00.000Z');
    expect(instant('2032-02-29T00:00:00.123456Z')).toBe('2032-02-29T00:00:00.123Z');
  });

  it('refuses what is no time, a day that its month does not have among it', () => {
    for (const text of [
      'noon',
      '1900000000',
      '05.04.2031 06:07',
      '2031-02-30T00:00:00Z',
      '2031-02-29T00:00:00Z',
      '2031-04-31T00:00:00Z',
      '2031-13-01T00:00:00Z',
      '2031-00-01T00:00:00Z',
      '2031-01-00T00:00:00Z',
      '2031-04-05T25:00:00Z',
      '2031-04-05T06:07:61Z',
      '2031-04-05T06:07:08+25:00',
    ])
      expect(faultOf({ measured_at: text })?.reason, text).toContain('is not a time such as');
    expect(faultOf({ measured_at: '0001-01-01T00:00:00+05:00' })?.reason).toBe('this time lies before 1950');
  });

  it('misses the name of a wafer and its time where neither file nor caller gives them', () => {
    expect(readFacts({}, {}).faults.map(({ column }) => column)).toEqual(['wafer', 'measured_at']);
  });

  it('names the column of a number that cannot be', () => {
    const wrong: RawMap['words'] = {
      slot: '1.5',
      temperature_c: 'warm',
      thickness_um: '-1',
      diameter_mm: '0',
      ingot_fraction: '1',
    };
    expect(
      readFacts({ ...least, ...wrong }, {})
        .faults.map(({ column }) => column)
        .sort(),
    ).toEqual(Object.keys(wrong).sort());
    expect(faultOf({ temperature_c: '250' })?.reason).toContain('"250" is not a temperature');
    expect(faultOf({ slot: '-1' })?.column).toBe('slot');
    expect(faultOf({ ingot_fraction: '0' })).toBeNull();
  });

  it('refuses a stage and a correction that it does not know', () => {
    expect(faultOf({ stage: 'during' })?.column).toBe('stage');
    expect(faultOf({ corrections_applied: 'thickness altitude' })?.reason).toContain('"altitude"');
    expect(faultOf({ corrections_applied: 'none spacing' })?.column).toBe('corrections_applied');
  });

  it('takes readings without a word on corrections as corrected in full, and with none as not at all', () => {
    const applied = (words: RawMap['words']) =>
      readFacts({ ...least, ...words }, {}).facts.correctionsApplied;
    expect(applied({})).toEqual(['temperature', 'thickness', 'geometry', 'spacing']);
    expect(applied({ corrections_applied: 'none' })).toEqual([]);
    expect(applied({ corrections_applied: 'spacing temperature' })).toEqual(['temperature', 'spacing']);
  });

  it('refuses names too long for an index of the database', () => {
    expect(faultOf({ wafer: 'W'.repeat(201) })).toEqual({
      column: 'wafer',
      reason: 'this is longer than 200 characters',
    });
    expect(faultOf({ note: 'n'.repeat(2000) })).toBeNull();
    expect(faultOf({ note: 'n'.repeat(2001) })?.column).toBe('note');
  });
});
