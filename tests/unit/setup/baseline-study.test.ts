import { describe, expect, it } from 'vitest';
import { baselineStudy } from '@/app/(line)/setup/streams/[slug]/limits/baseline-study';

const points = (levels: number[], withins: (number | null)[] = []) =>
  levels.map((level, i) => ({
    id: String(i),
    key: String(i),
    at: new Date(i * 1000),
    level,
    within: withins[i] ?? null,
    between: null,
    wafers: 1,
  }));
const quiet = Array.from({ length: 30 }, (_, i) => 10 + (i % 2 === 0 ? 0.1 : -0.1));

describe('baselineStudy', () => {
  it('finds no point beyond limits drawn from levels that only alternate', () => {
    const study = baselineStudy(points(quiet));
    expect(study.limits?.n).toBe(30);
    expect(study.limits !== null && study.beyond).toEqual([]);
  });

  it('names the point that lies beyond its own limits, and on which charts', () => {
    const study = baselineStudy(points([...quiet, 13, ...quiet]));
    const beyond = study.limits === null ? [] : study.beyond;
    expect(beyond.map(({ point, charts }) => [point.id, charts])).toEqual([
      ['30', ['level, above', 'moving range']],
      ['31', ['moving range']],
    ]);
  });

  it('says why no limits come of too few subgroups, or of equal ones', () => {
    expect(baselineStudy([])).toMatchObject({ limits: null });
    expect(baselineStudy(points([1]))).toMatchObject({ limits: null });
    expect(baselineStudy(points([1, 1, 1]))).toMatchObject({ limits: null });
  });
});
