import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { joinedMembers } from '@/lib/excursions/joined-members';
import { emptyLine, newId } from './line-store';
import { wafers } from './streams';

const setting = { subgroupSize: 3, limits: [], restarts: [] };
const run = (levels: readonly (number | null)[]) => wafers(levels).map((wafer) => ({ ...wafer, key: 'r1' }));

describe('wafers joined to a line', () => {
  it('make a subgroup with its mean, root mean square spread within and spread between', () => {
    const line = emptyLine(setting);
    const additions = run([1, 2, 6]).map((wafer, i) => ({ ...wafer, within: [3, 4, 5][i]! }));
    const { pointOf, touched, from } = joinedMembers(line, additions, newId);
    expect(line.points).toHaveLength(1);
    expect(line.points[0]).toMatchObject({ level: 3, within: Math.sqrt(50 / 3), at: 10 });
    expect(line.points[0]?.between).toBeCloseTo(Math.sqrt(7), 12);
    expect(pointOf).toEqual([line.points[0], line.points[0], line.points[0]]);
    expect([touched.size, from]).toEqual([1, 0]);
  });

  it('that are not judged belong to their subgroup but make no figures', () => {
    const line = emptyLine(setting);
    joinedMembers(line, run([null, 2, null]), newId);
    expect(line.points[0]).toMatchObject({ level: 2, within: 1, between: null });
    expect(line.points[0]?.members).toHaveLength(3);
  });

  it('have figures that do not depend on their order, to the last bit', () => {
    const level = fc.double({ min: 0.1, max: 10, noNaN: true });
    fc.assert(
      fc.property(fc.array(level, { minLength: 1, maxLength: 6 }), fc.nat(), (levels, turn) => {
        const [one, other] = [emptyLine(setting), emptyLine(setting)];
        const cut = turn % levels.length;
        joinedMembers(one, run(levels), newId);
        for (const wafer of [...run(levels).slice(cut), ...run(levels).slice(0, cut)]) {
          joinedMembers(other, [wafer], newId);
        }
        const { level, within, between, at } = one.points[0]!;
        expect(other.points[0]).toMatchObject({ level, within, between, at });
      }),
    );
  });

  it('stand by time, then by key, and are judged from the earliest place that changed', () => {
    const line = emptyLine(setting);
    const [a, b, c] = wafers([1, 2, 3]);
    joinedMembers(line, [c!, { ...b!, at: 10, key: 'a' }, a!], newId);
    expect(line.points.map(({ key }) => key)).toEqual(['a', 'k0000', 'k0002']);
    expect(joinedMembers(line, [{ ...c!, waferId: 'x', at: 20 }], newId).from).toBe(2);
    expect(joinedMembers(line, [{ ...c!, waferId: 'y', at: 5 }], newId).from).toBe(0);
    expect(line.points.map(({ key }) => key)).toEqual(['k0002', 'a', 'k0000']);
  });
});
