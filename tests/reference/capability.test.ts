import { describe, expect, it } from 'vitest';
import { capability } from '@/lib/command/verbs/capability';
import { capability as capabilityOf } from '@/lib/control/capability';
import { referenceDataPresent, referencePath, referenceRows } from '../support/reference-data';

describe.skipIf(!referenceDataPresent)('capability of published data', () => {
  it('is that of the furnace oxide, e-Handbook section 3.5.1 (partly from memory): Cp 1.313, Cpk 1.273, Cpm 1.304', async () => {
    let printed = '';
    const words = [
      '--value',
      'thickness_angstrom',
      '--lower',
      '460',
      '--upper',
      '660',
      '--target',
      '560',
      '--json',
    ];
    const output = { out: (text: string) => (printed += text), say: () => undefined };
    expect(await capability.run([referencePath('nist_furnace_oxide.csv'), ...words], output)).toBe(0);
    const found = JSON.parse(printed) as Record<string, number | boolean>;
    expect(found.mean).toBeCloseTo(563.0357, 4);
    expect(found.cp).toBeCloseTo(1.313, 3);
    expect(found.cpk).toBeCloseTo(1.273, 3);
    expect(found.cpm).toBeCloseTo(1.304, 3);
    expect(found.stable).toBe(false);
  });

  it('is Cp 1.192 for the flow width of Montgomery, Introduction to Statistical Quality Control (from memory), by mean range', () => {
    const groups = referenceRows('textbook_flow_width.csv').map((row) =>
      [row.x1, row.x2, row.x3, row.x4, row.x5].map(Number),
    );
    const found = capabilityOf(groups, { lower: 1, upper: 2, target: null }, { estimator: 'mean-range' });
    expect(found?.cp?.value).toBeCloseTo(1.192, 3);
  });
});
