import type { SiteStatus } from '@/lib/wafer/measure-wafer';

/** What became of a reading, in words. */
export const STATUS_WORDS: Record<SiteStatus, string> = {
  good: 'counts',
  excluded: 'in the edge exclusion',
  missing: 'no reading',
  zero: 'zero: impossible',
  negative: 'negative: impossible',
  'not-a-number': 'not a number',
  outlier: 'far from the smooth surface, and alone in it',
  'by-hand': 'taken out by a person',
};
