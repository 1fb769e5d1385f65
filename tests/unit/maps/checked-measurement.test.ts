import { describe, expect, it } from 'vitest';
import { checkedMeasurement, type CheckContext } from '@/lib/maps/checked-measurement';
import type { RawMap } from '@/lib/maps/raw-maps';
import type { StreamSettings } from '@/lib/streams/types';
import { plan, rawMap, settings } from './demo-settings';

function check(map: RawMap, own: StreamSettings = settings(), context: Partial<CheckContext> = {}) {
  return checkedMeasurement(map, {
    file: 'monday.csv',
    valueColumn: 'resistivity_ohm_cm',
    defaults: {},
    settingsOf: (slug) => (slug === own.stream.slug ? own : undefined),
    mayRecord: () => true,
    now: new Date('2031-04-06T00:00:00Z'),
    ...context,
  });
}

function problems(...args: Parameters<typeof check>) {
  const found = check(...args);
  return 'problems' in found
    ? found.problems.map(({ line, column, reason }) => ({ line, column, reason }))
    : [];
}

const because = (...args: Parameters<typeof check>) => problems(...args).map(({ reason }) => reason);

describe('a measurement checked against its stream', () => {
  it('comes out in the order of the site plan, a site without a row as null', () => {
    const map = rawMap();
    const order = [...map.values.keys()].reverse().slice(1);
    const pick = <T>(list: T[]) => order.map((i) => list[i] as T);
    const found = check({
      ...map,
      xMm: pick(map.xMm),
      yMm: pick(map.yMm),
      values: pick(map.values),
      lines: pick(map.lines),
    });
    expect('measurement' in found && found.measurement).toMatchObject({
      streamId: '7',
      facts: { wafer: 'W1', lot: null },
      readings: [...map.values.slice(0, -1), null],
    });
    expect(found.name).toBe('W1');
  });

  it('is refused where whoever sent it may not record wafers of its stream', () => {
    const others = { mayRecord: (streamId: string) => streamId !== '7' };
    expect(problems(rawMap(), settings(), others)).toEqual([
      { line: 2, column: 'stream', reason: expect.stringContaining('you may not record wafers') },
    ]);
  });

  it('allows a place a tenth of a millimetre', () => {
    const near = rawMap({}, { xMm: rawMap().xMm.map((x) => x + 0.09) });
    expect(problems(near)).toEqual([]);
    expect(because(rawMap({}, { xMm: near.xMm.map((x) => x + 0.05) }))[0]).toContain(
      'is no site of the plan "polar 9"',
    );
  });

  it('is refused with the line of a site off the wafer, off the plan, or read twice', () => {
    const [x, y] = [rawMap().xMm, rawMap().yMm];
    x[1] = 101;
    x[2] = 1;
    [x[3], y[3]] = [x[0] as number, y[0] as number];
    expect(problems(rawMap({}, { xMm: x, yMm: y }))).toEqual([
      { line: 3, column: 'x_mm', reason: expect.stringMatching(/\(101, .*outside a wafer of 200 mm/) },
      { line: 4, column: 'x_mm', reason: expect.stringContaining('no site of the plan') },
      { line: 5, column: 'x_mm', reason: 'this site has a reading already, on line 2' },
    ]);
  });

  it('is refused when its stream does not exist or is not named', () => {
    expect(problems(rawMap({ stream: 'boron-b' }))).toEqual([
      { line: 2, column: 'stream', reason: 'there is no stream "boron-b"' },
    ]);
    expect(because(rawMap({ stream: '' }))).toEqual(['no stream is named']);
    expect(problems(rawMap({ stream: '' }), settings(), { defaults: { stream: ' boron-a ' } })).toEqual([]);
  });

  it('is refused in another quantity or on another diameter than the stream is about', () => {
    expect(problems(rawMap(), settings(), { valueColumn: 'sheet_resistance_ohm_sq' })).toEqual([
      {
        line: 2,
        column: 'sheet_resistance_ohm_sq',
        reason: 'the stream boron-a is measured as resistivity_ohm_cm',
      },
    ]);
    expect(problems(rawMap({ diameter_mm: '150' }))).toMatchObject([{ column: 'diameter_mm' }]);
    expect(problems(rawMap({ diameter_mm: '200.0' }))).toEqual([]);
  });

  it('names the run or lot that a stream of runs, lots or ingots counts', () => {
    expect(problems(rawMap(), settings({ subgroup: 'run' }))).toMatchObject([{ column: 'run' }]);
    expect(problems(rawMap(), settings({ subgroup: 'lot' }))).toMatchObject([{ column: 'lot' }]);
    expect(problems(rawMap({ run: 'R1' }), settings({ subgroup: 'ingot' }))).toMatchObject([
      { column: 'lot' },
    ]);
    expect(problems(rawMap({ run: 'R1' }), settings({ subgroup: 'run' }))).toEqual([]);
  });

  it('lies in the past, but for clocks that differ by a few minutes', () => {
    const late = '2031-04-06T00:11:00Z';
    expect(problems(rawMap({ measured_at: late }))).toEqual([
      { line: 2, column: 'measured_at', reason: 'this time lies in the future' },
    ]);
    expect(problems(rawMap({ processed_at: late }))).toMatchObject([{ column: 'processed_at' }]);
    expect(problems(rawMap({ measured_at: '2031-04-06T00:09:00Z' }))).toEqual([]);
  });

  it('can be corrected for temperature only, within the range and for the silicon that the method knows', () => {
    const words = { corrections_applied: 'thickness geometry spacing', temperature_c: '25' };
    expect(problems(rawMap(words))).toEqual([]);
    expect(problems(rawMap({ ...words, temperature_c: '' }))).toMatchObject([{ column: 'temperature_c' }]);
    expect(problems(rawMap({ ...words, temperature_c: '29' }))).toEqual([]);
    expect(problems(rawMap({ ...words, temperature_c: '80' }))).toMatchObject([
      { column: 'temperature_c', reason: expect.stringMatching(/340 K.*Correct it at the gauge\.$/) },
    ]);
    expect(because(rawMap({ corrections_applied: 'temperature' }))[0]).toContain(
      'not corrected for thickness and geometry and spacing',
    );
    expect(because(rawMap(words), settings({}, { target: null }))[0]).toContain('the stream has no target');
  });

  it('of a layer is corrected by its own profile, or refused where that has none', () => {
    const words = { corrections_applied: 'thickness geometry spacing', temperature_c: '25' };
    const ofLayer = (target: Parameters<typeof settings>[1]) =>
      because(rawMap(words), settings({ quantity: 'sheet_resistance' }, target), {
        valueColumn: 'sheet_resistance_ohm_sq',
      });
    const gaussian = { quantity: 'sheet_resistance', profile: 'gaussian', densityPerCm3: 1e19 } as const;
    const on = { lengthUm: 0.5, backgroundDopant: 'phosphorus', backgroundDensityPerCm3: 1e15 } as const;
    expect(ofLayer({ target: { ...gaussian, ...on } })).toEqual([]);
    expect(ofLayer({ target: gaussian })[0]).toContain('Correct it at the gauge');
  });

  it('is refused with the line of each reading that the temperature correction does not reach', () => {
    const words = { corrections_applied: 'thickness geometry spacing', temperature_c: '25' };
    const values = rawMap().values.map((value, i) =>
      i === 2 ? 500.1 : i === 4 ? 0.0009 : i === 5 ? -1 : value,
    );
    expect(problems(rawMap(words, { values }))).toEqual(
      [2, 4].map((row) => ({
        line: rawMap().lines[row],
        column: 'resistivity_ohm_cm',
        reason: `The temperature coefficient is published from 0.001 to 500 Ω·cm, not at ${values[row]}. Correct it at the gauge.`,
      })),
    );
    expect(problems(rawMap({}, { values }))).toEqual([]);
    expect(problems(rawMap(words, { values: values.map(() => 600) }))).toHaveLength(9);
  });

  it('tells every fault at once, and those of rows instead of what follows from them', () => {
    const map = rawMap(
      { measured_at: 'noon', diameter_mm: '150' },
      { faults: [{ line: 4, column: 'x_mm', reason: 'r' }] },
    );
    map.xMm[2] = NaN;
    expect(problems(map)).toEqual([
      { line: 4, column: 'x_mm', reason: 'r' },
      { line: 2, column: 'measured_at', reason: expect.any(String) },
      { line: 2, column: 'diameter_mm', reason: expect.any(String) },
    ]);
  });

  it('has a name for people and an identity that no fault takes away', () => {
    const found = check(rawMap({ run: 'R1', diameter_mm: 'wide' }));
    expect(found.name).toBe('W1 (R1)');
    expect(found.identity).toBe(check(rawMap({ run: 'R1', lot: 'L1', gauge: 'G' })).identity);
    expect(found.identity).not.toBe(check(rawMap({ run: 'R2' })).identity);
    const nameless = check(rawMap({ wafer: '', run: 'R1' }));
    expect('problems' in nameless && nameless.problems[0]?.measurement).toBeNull();
  });

  it('keeps to 20 faults of places', () => {
    const many = Array.from({ length: 50 }, (_, i) => i);
    const map = rawMap({}, { xMm: many.map(() => 300), yMm: many, values: many, lines: many });
    expect(problems(map)).toHaveLength(20);
    expect(plan.sites.length).toBe(9);
  });
});
