import { describe, expect, it } from 'vitest';
import { specificationSpans } from '@/app/(line)/excursions/[id]/specification-spans';
import type { CasePoint, CaseSpecification, CaseStream } from '@/lib/excursions/types';

const day = (number: number) => new Date(Date.UTC(2031, 2, number));
const stream: CaseStream = {
  id: '1',
  slug: 'a',
  name: 'N-epi',
  subgroup: 'run',
  quantity: 'resistivity',
  chartedValue: 'statistic',
};
const points = [1, 2, 3, 4].map((number): CasePoint => ({
  id: `${number}`,
  key: `R${number}`,
  at: day(number),
  state: 'judged',
  level: 1,
  movingRange: null,
  within: 1,
  between: null,
  limitsId: null,
  completions: [],
  outOfSpecification: false,
  wafers: 1,
  firstWaferId: null,
}));
const revision = (number: number, from: Date, over: Partial<CaseSpecification> = {}): CaseSpecification => ({
  revision: number,
  effectiveFrom: from,
  meanLower: number,
  meanUpper: null,
  nonuniformityMetric: 'relativeStandardDeviationPercent',
  nonuniformityUpper: 3,
  ...over,
});

describe('the specification along a case', () => {
  it('is what was in force for each subgroup, the first one also for those from before it', () => {
    const specifications = [revision(1, day(2)), revision(2, day(3))];
    expect(specificationSpans({ points, specifications, stream }, 'level')).toEqual([
      { fromIndex: 0, toIndex: 1, lower: 1, upper: null },
      { fromIndex: 2, toIndex: 3, lower: 2, upper: null },
    ]);
  });

  it('is drawn on the spread within only where that is what was agreed', () => {
    const agreed = [revision(1, day(1)), revision(2, day(3), { nonuniformityMetric: null })];
    expect(specificationSpans({ points, specifications: agreed, stream }, 'within')).toEqual([
      { fromIndex: 0, toIndex: 1, lower: null, upper: 3 },
    ]);
    const again = [...agreed, revision(3, day(4))];
    expect(specificationSpans({ points, specifications: again, stream }, 'within')).toMatchObject([
      { fromIndex: 0, toIndex: 1 },
      { fromIndex: 3, toIndex: 3 },
    ]);
  });

  it('is nothing on a relative level, nor without one', () => {
    const relative = { ...stream, chartedValue: 'relative' as const };
    const specifications = [revision(1, day(1))];
    expect(specificationSpans({ points, specifications, stream: relative }, 'level')).toEqual([]);
    expect(specificationSpans({ points, specifications: [], stream }, 'level')).toEqual([]);
  });
});
