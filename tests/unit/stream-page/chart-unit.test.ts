import { describe, expect, it } from 'vitest';
import { chartUnit } from '@/app/(line)/streams/[slug]/chart-unit';

const stream = { quantity: 'resistivity', chartedValue: 'statistic', controlStatistic: 'areaMean' } as const;

describe('the unit of a level chart', () => {
  it('suits the size of what is charted', () => {
    expect(chartUnit(stream, 5.6)).toEqual({
      unit: 'Ω·cm',
      factor: 1,
      levelLabel: 'Ω·cm, area mean at 23 °C',
    });
    expect(chartUnit(stream, 0.012)).toMatchObject({ unit: 'mΩ·cm', factor: 1000 });
    expect(chartUnit({ ...stream, quantity: 'sheet_resistance' }, 26_600)).toMatchObject({
      unit: 'kΩ/□',
      factor: 1e-3,
    });
    expect(chartUnit(stream, null).unit).toBe('Ω·cm');
  });

  it('is percent where readings are charted against expected', () => {
    expect(chartUnit({ ...stream, chartedValue: 'relative' }, -2)).toMatchObject({ unit: '%', factor: 1 });
  });
});
