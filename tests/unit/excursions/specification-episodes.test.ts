import { describe, expect, it } from 'vitest';
import { add, emptyLine, keyed, LineStore, trim } from './line-store';
import { quiet, wafers } from './streams';

const setting = { subgroupSize: 1, limits: [], restarts: [] };

describe('out of specification', () => {
  it('is a signal of its own for each way, and goes on while subgroups follow each other', () => {
    const line = emptyLine(setting);
    const faults = [['site:above'], ['site:above', 'wafer-mean:below'], [], ['site:above']];
    add(
      line,
      wafers(quiet(4)).map((wafer, i) => ({ ...wafer, specification: faults[i]! })),
    );
    expect(keyed(line)).toEqual([
      ['specification site above', 'k0000', 'k0001', 2],
      ['specification site above', 'k0003', 'k0003', 1],
      ['specification wafer-mean below', 'k0001', 'k0001', 1],
    ]);
    expect(line.excursions.map(({ family, side }) => [family, side])).toEqual([
      ['specification', 'above'],
      ['specification', 'below'],
    ]);
  });

  it('of a run of wafers for longer than is loaded stays one signal', () => {
    const runs = { ...setting, subgroupSize: 3 };
    const store = new LineStore(runs);
    let line = emptyLine(runs);
    wafers(quiet(400)).forEach((wafer, i) => {
      const addition = { ...wafer, key: `r${Math.floor(i / 3)}`, specification: ['site:above'] };
      line = store.record(line, [addition]);
      trim(line);
    });
    expect(keyed(store.load(-Infinity))).toEqual([['specification site above', 'r0', 'r133', 134]]);
    expect(store.wholeLoads).toBe(0);
  });
});
