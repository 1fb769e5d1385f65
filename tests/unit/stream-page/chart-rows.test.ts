import { describe, expect, it } from 'vitest';
import { type ChartSource, chartRows } from '@/app/(line)/streams/[slug]/chart-points';
import { modelsOf } from '@/lib/excursions/point-expected';
import { spanPoint, spanWafer, BORON } from './fixtures';

const source = (over: Partial<ChartSource> = {}): ChartSource => ({
  stream: { subgroup: 'wafer', chartedValue: 'statistic', repeatabilityPercent: 0.7 },
  points: [0, 1, 2].map((nth) => ({ ...spanPoint(nth, { level: 13 + nth / 10 }), index: nth })),
  wafersOf: new Map(['1', '2', '3'].map((id) => [id, [spanWafer(id)]])),
  modelOf: modelsOf([{ id: 't1', target: BORON }]),
  unit: { unit: 'Ω·cm', factor: 1, levelLabel: '' },
  timeZone: 'Europe/Berlin',
  isFiltered: false,
  ...over,
});

describe('the rows of a stream’s charts', () => {
  it('name the wafer, lead to it, and say the time of the site', () => {
    const [row] = chartRows(source());
    expect(row?.label).toBe('wafer M0001/0');
    expect(row?.href).toBe('/wafers/w1');
    expect(row?.texts.at).toBe('2031-04-05 08:00');
    expect(row?.day).toMatch(/^5\sApr$/);
  });

  it('hold the level against expected, in percent and as percent dopant with its uncertainty', () => {
    const [row] = chartRows(source({ points: [{ ...spanPoint(0, { level: 13.306 * 0.98 }), index: 0 }] }));
    expect(row?.texts.difference).toMatch(/^−2\.0 ± 2\.0\s%$/);
    expect(row?.texts.dopant).toMatch(/^\+2\.1 ± 2\.0\s%$/);
    expect(row?.texts.expected).toMatch(/^13\.31 ± 0\.27\sΩ·cm$/);
  });

  it('say what density a point stands for, and how it differs from the one before it by the gauge alone', () => {
    const [first, second] = chartRows(source());
    expect(first?.texts.density).toMatch(/^1\.02\s×\s10¹⁵\scm⁻³$/);
    expect(first?.texts.onBefore).toBeNull();
    // 13.0 to 13.1 Ω·cm: −100·ln(13.1/13)/0.986; 0.7 % over 49 sites of each: 0.7·√(2/49)/0.986.
    expect(second?.texts.onBefore).toMatch(/^−0\.78 ± 0\.14\s%$/);
  });

  it('stand for no one density where their wafers are of different places along a crystal', () => {
    const wafers = [0.1, 0.5].map((ingotFraction) => spanWafer('1', { ingotFraction }));
    expect(chartRows(source({ wafersOf: new Map([['1', wafers]]) }))[0]?.texts.density).toBeNull();
  });

  it('compare with the point before each by its own target', () => {
    const wafersOf = new Map([
      ['1', [spanWafer('1', { expected: 13 })]],
      ['2', [spanWafer('2', { expected: 13.1 })]],
    ]);
    const points = [0, 1].map((nth) => ({ ...spanPoint(nth, { level: 13 + nth / 10 }), index: nth }));
    expect(chartRows(source({ points, wafersOf }))[1]?.texts.onBefore).toMatch(/^0\.00 ± 0\.14\s%$/);
  });

  it('read a relative level as what it is: 100·ln(measured/expected)', () => {
    const [row] = chartRows(
      source({
        stream: { subgroup: 'run', chartedValue: 'relative', repeatabilityPercent: 0.7 },
        points: [{ ...spanPoint(0, { key: 'R0042', level: -2.02 }), index: 0 }],
        unit: { unit: '%', factor: 1, levelLabel: '' },
      }),
    );
    expect(row?.label).toBe('run R0042');
    expect(row?.texts.level).toMatch(/^−2\.02\s%$/);
    expect(row?.texts.difference).toMatch(/^−2\.0 ± 2\.0\s%$/);
    expect(row?.texts.dopant).toMatch(/^\+2\.1 ± 2\.0\s%$/);
  });

  it('are in the unit of the chart', () => {
    const unit = { unit: 'mΩ·cm', factor: 1000, levelLabel: '' };
    const [row] = chartRows(source({ unit, points: [{ ...spanPoint(0, { level: 0.0123 }), index: 0 }] }));
    expect(row?.level).toBeCloseTo(12.3, 12);
    expect(row?.texts.level).toMatch(/^12\.30\smΩ·cm$/);
  });

  it('of a filtered view mark no rule and range from one shown subgroup to the next', () => {
    const points = [0, 1, 2].map((nth) => ({
      ...spanPoint(nth, { level: [10, 12, 11][nth] ?? 0, movingRange: 7, completions: ['level:a:above'] }),
      index: nth,
    }));
    const rows = chartRows(source({ points, isFiltered: true }));
    expect(rows.map((row) => row.movingRange)).toEqual([null, 2, 1]);
    expect(rows.flatMap((row) => row.completions)).toEqual([]);
    expect(chartRows(source({ points })).map((row) => row.movingRange)).toEqual([7, 7, 7]);
  });

  it('leave a gap where nothing was judged, and say why', () => {
    const point = spanPoint(0, { level: null, within: null, state: 'not-judged' });
    const wafers = [spanWafer('1', { level: null, expected: null, notJudgedReason: 'too few good sites' })];
    const [row] = chartRows(source({ points: [{ ...point, index: 0 }], wafersOf: new Map([['1', wafers]]) }));
    expect([row?.level, row?.judged, row?.texts.level]).toEqual([null, false, '—']);
    expect(row?.texts.notes.join()).toContain('Wafer 07 is not judged: too few good sites');
    expect(row?.texts.difference).toBeNull();
  });

  it('are hollow where a subgroup came late or a wafer was measured again, not for history', () => {
    const recorded = (times: number[], over = {}) =>
      new Map(
        times.map((recordedAt, nth) => [
          String(nth + 1),
          [spanWafer(String(nth + 1), { recordedAt, ...over })],
        ]),
      );
    const hollow = (wafersOf: ChartSource['wafersOf']) =>
      chartRows(source({ wafersOf })).map((row) => row.hollow);
    expect(hollow(recorded([1, 2, 3]))).toEqual([false, false, false]);
    expect(hollow(recorded([5, 2, 3]))).toEqual([true, false, false]);
    expect(hollow(recorded([5, 2, 3], { history: true }))).toEqual([false, false, false]);
    expect(hollow(recorded([1, 2, 3], { isMeasuredAgain: true }))).toEqual([true, true, true]);
  });

  it('say that expected differs where the wafers of a subgroup differ in it', () => {
    const wafers = [spanWafer('1', { expected: 13 }), spanWafer('1', { expected: 14 })];
    const [row] = chartRows(source({ wafersOf: new Map([['1', wafers]]) }));
    expect([row?.texts.expected, row?.texts.difference]).toEqual(['differs by wafer', null]);
  });
});
