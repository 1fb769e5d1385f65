import { describe, expect, it } from 'vitest';
import { budgetRows, knownRows, layerRows, worthRows } from '@/app/(line)/setup/expected-rows';
import { carrierRows } from '@/app/(line)/setup/carrier-rows';
import { expectedValue } from '@/lib/physics/expected-value';
import { BORON, DRIVEN, EPI, GAUSSIAN } from '../physics/targets';

const text = (rows: { name: unknown; value: unknown }[]) =>
  Object.fromEntries(rows.map(({ name, value }) => [String(name), String(value).replaceAll('\u00a0', ' ')]));

describe('the rows of an expected value', () => {
  it('keep the tolerance apart from what is not known', () => {
    const target = { ...BORON, tolerancePercent: 5 };
    const rows = text(knownRows(target, expectedValue(target)));
    // 3 %/√3 (ASTM F723; JCGM 100:2008, 4.3.7), the same with or without a tolerance.
    expect(rows['standard uncertainty']).toBe('1.73 %');
    expect(rows['at the tolerance']).toMatch(/^12\.\d+ to 1[34]\.\d+ Ω·cm$/);
  });

  it('say what a percent and a degree are worth, of what applies alone', () => {
    // d ln ρ/d ln N of boron at 1e15 is −0.986, C_T 0.831 % per °C (SP 400-64, ASTM F84).
    const uniform = text(worthRows(BORON, 13.306));
    expect(uniform['1 % more dopant reads']).toBe('−0.99 %, −131 mΩ·cm');
    expect(uniform['a wafer 1 °C warmer reads']).toMatch(/^\+0\.83 %/);
    expect(uniform['a drive-in 1 °C hotter reads']).toBeUndefined();
    expect(text(worthRows(DRIVEN, 100))['a drive-in 1 °C hotter reads']).toMatch(/%/);
    expect(Object.keys(text(worthRows(GAUSSIAN, 170)))[0]).toBe('1 % more dose reads');
  });

  it('show junction and dose of a graded layer: 1.517 µm, 4.431e14 (own integral)', () => {
    const rows = text(layerRows(GAUSSIAN, 1e19));
    expect(rows).toMatchObject({ 'junction at': '1.517 µm', 'dose in the silicon': '4.43 × 10¹⁴ cm⁻²' });
    expect(layerRows(BORON, 1e15)).toEqual([]);
  });

  it('show each part of the uncertainty with its bound', () => {
    expect(text(budgetRows(BORON))).toEqual({ 'conversion, common to all wafers': '±3.0 % at most, 1.73 %' });
    expect(budgetRows(GAUSSIAN)).toHaveLength(2);
  });

  it('show both carriers of uniform silicon, and none of a graded layer', () => {
    const rows = text(carrierRows(BORON, 1e15, 23));
    expect(rows['holes']).toBe('1.00 × 10¹⁵ cm⁻³');
    expect(rows['electrons']).toMatch(/× 10⁴ cm⁻³$/);
    expect(text(carrierRows({ ...EPI, dopant: 'antimony' }, 1e15, 23))['share ionized']).toBe('—');
    expect(carrierRows(GAUSSIAN, 1e19, 23)).toEqual([]);
  });
});
