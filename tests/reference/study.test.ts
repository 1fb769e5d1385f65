import { describe, expect, it } from 'vitest';
import { study } from '@/lib/command/verbs/study';
import { referenceDataPresent, referencePath } from '../support/reference-data';

interface Chart {
  name: string;
  centre: number;
  upper: number;
  lower: number;
  sigma: number;
  points: (number | null)[];
  signals: { point: number; rule: string }[];
}

async function charts(...args: string[]): Promise<Chart[]> {
  let printed = '';
  const status = await study.run([...args, '--json'], {
    out: (text) => (printed += text),
    say: () => undefined,
  });
  expect(status).toBe(0);
  return (JSON.parse(printed) as { charts: Chart[] }).charts;
}

describe.skipIf(!referenceDataPresent)('the study of published data', () => {
  it('gives the individuals chart of the NIST/SEMATECH e-Handbook, section 6.3.2.2 (from memory)', async () => {
    const [level, ranges] = await charts(
      referencePath('nist_individuals_example.csv'),
      '--value',
      'flowrate',
    );
    expect(level?.centre).toBeCloseTo(50.81, 10);
    expect(ranges?.centre).toBeCloseTo(1.8778, 4);
    // The handbook divides by d2 = 1.128; the exact d2 is 1.12838, which moves each limit by 0.0017.
    expect(level?.upper).toBeCloseTo(50.81 + ((55.8041 - 50.81) * 1.128 * Math.sqrt(Math.PI)) / 2, 3);
    expect(level?.lower).toBeCloseTo(50.81 - ((50.81 - 45.8159) * 1.128 * Math.sqrt(Math.PI)) / 2, 3);
    expect(ranges?.upper).toBeCloseTo(3.267 * 1.8778, 2);
    expect(level?.signals).toEqual([]);
  });

  it('gives the flow width example of Montgomery, Introduction to Statistical Quality Control (from memory)', async () => {
    const file = referencePath('textbook_flow_width.csv');
    const [level, range] = await charts(file, '--values', 'x1,x2,x3,x4,x5', '--chart', 'mean-range');
    expect(level?.centre).toBeCloseTo(1.5056, 4);
    expect(range?.centre).toBeCloseTo(0.32521, 5);
    // The book's limits use A2 = 0.577 and D4 = 2.114, rounded to three places.
    expect(Math.abs((level?.upper ?? 0) - 1.69325)).toBeLessThan(0.0005 * 0.32521);
    expect(Math.abs((level?.lower ?? 0) - 1.31795)).toBeLessThan(0.0005 * 0.32521);
    expect(Math.abs((range?.upper ?? 0) - 0.68749)).toBeLessThan(0.0006 * 0.32521);
    expect(range?.lower).toBe(0);
    expect([level, range].flatMap((chart) => chart?.signals)).toEqual([]);
    const [byS] = await charts(file, '--values', 'x1,x2,x3,x4,x5', '--chart', 'mean-s');
    expect(byS?.upper).toBeCloseTo(level?.upper ?? 0, 2);
  });
});
