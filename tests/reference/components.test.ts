import { describe, expect, it } from 'vitest';
import { components } from '@/lib/command/verbs/components';
import { varianceComponents, type ComponentLevel } from '@/lib/control/variance-components';
import { referenceDataPresent, referencePath, referenceRows } from '../support/reference-data';

async function levels(file: string, value: string, nest: string): Promise<ComponentLevel[]> {
  let printed = '';
  const status = await components.run([referencePath(file), '--value', value, '--nest', nest, '--json'], {
    out: (text) => (printed += text),
    say: () => undefined,
  });
  expect(status).toBe(0);
  return (JSON.parse(printed) as { levels: ComponentLevel[] }).levels;
}

describe.skipIf(!referenceDataPresent)('variance components of published data', () => {
  it('are those of the furnace oxide, NIST/SEMATECH e-Handbook, section 3.5.1, to its digits', async () => {
    const [run, zone, within] = await levels('nist_furnace_oxide.csv', 'thickness_angstrom', 'run,zone');
    expect([run?.name, zone?.name, within?.name]).toEqual(['run', 'zone', 'within']);
    expect([run, zone, within].map((level) => level?.degreesOfFreedom)).toEqual([20, 63, 84]);
    expect(run?.sumOfSquares).toBeCloseTo(61442.29, 2);
    expect(zone?.sumOfSquares).toBeCloseTo(36014.5, 1);
    expect(within?.sumOfSquares).toBeCloseTo(10155, 1);
    expect(run?.meanSquare).toBeCloseTo(3072.11, 2);
    expect(zone?.meanSquare).toBeCloseTo(571.659, 3);
    expect(within?.meanSquare).toBeCloseTo(120.893, 3);
    expect(run?.f).toBeCloseTo(5.37404, 5);
    expect(zone?.f).toBeCloseTo(4.72864, 5);
    expect(run?.variance).toBeCloseTo(312.557, 3);
    expect(zone?.variance).toBeCloseTo(225.383, 3);
    expect(within?.variance).toBeCloseTo(120.893, 3);
  });

  it('named to the wafer are the same, the wafer being the innermost', async () => {
    const named = await levels('nist_furnace_oxide.csv', 'thickness_angstrom', 'run,zone,wafer');
    expect(named.map((level) => level.name)).toEqual(['run', 'zone', 'wafer']);
    expect(named[2]?.variance).toBeCloseTo(120.893, 3);
  });

  it('are those certified for the resistivity of silicon (NIST StRD, SiRstv) to twelve digits', () => {
    const rows = referenceRows('nist_silicon_resistivity_anova.csv').map((row) => ({
      labels: [row.group ?? ''],
      value: Number(row.y),
    }));
    const [between, within] = varianceComponents(rows, ['instrument']).levels;
    const digits = (computed: number | null | undefined, certified: number): number =>
      -Math.log10(Math.max(1e-16, Math.abs(((computed ?? NaN) - certified) / certified)));
    expect(digits(between?.sumOfSquares, 5.11462616e-2)).toBeGreaterThan(12);
    expect(digits(within?.sumOfSquares, 2.1663656e-1)).toBeGreaterThan(12);
    expect(digits(between?.f, 1.18046237440255)).toBeGreaterThan(12);
    const all = (between?.sumOfSquares ?? 0) + (within?.sumOfSquares ?? 0);
    expect(digits((between?.sumOfSquares ?? 0) / all, 0.190999039051129)).toBeGreaterThan(12);
  });
});
