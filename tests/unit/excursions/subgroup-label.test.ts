import { expect, it } from 'vitest';
import { subgroupLabel } from '@/lib/excursions/subgroup-label';

it('names a subgroup as people say it, a wafer without the time that tells its measurements apart', () => {
  expect(subgroupLabel('run', 'R0042')).toBe('run R0042');
  expect(subgroupLabel('lot', 'a/b')).toBe('lot a/b');
  expect(subgroupLabel('wafer', 'M0003/07/2031-04-05T06:07:00.000Z')).toBe('wafer M0003/07');
  expect(subgroupLabel('wafer', '/W-2207/2031-04-05T06:07:00.000Z')).toBe('wafer W-2207');
  expect(subgroupLabel('wafer', 'odd')).toBe('wafer odd');
});
