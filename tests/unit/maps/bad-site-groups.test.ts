import { describe, expect, it } from 'vitest';
import { badSiteGroups } from '@/lib/maps/bad-site-groups';

describe('bad sites told in lines', () => {
  it('tells impossible ones of a kind together, and each one that may be put back alone', () => {
    expect(
      badSiteGroups([
        { siteIndex: 1, reason: 'zero' },
        { siteIndex: 2, reason: 'outlier' },
        { siteIndex: 4, reason: 'missing' },
        { siteIndex: 5, reason: 'zero' },
        { siteIndex: 7, reason: 'by-hand' },
      ]),
    ).toEqual([
      { reason: 'outlier', siteIndices: [2] },
      { reason: 'by-hand', siteIndices: [7] },
      { reason: 'zero', siteIndices: [1, 5] },
      { reason: 'missing', siteIndices: [4] },
    ]);
    expect(badSiteGroups([])).toEqual([]);
  });
});
