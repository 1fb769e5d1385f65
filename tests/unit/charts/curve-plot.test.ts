import { describe, expect, it } from 'vitest';
import { curvePath } from '@/app/_charts/curve-path';
import { plotAxis } from '@/app/_charts/plot-axis';

describe('curvePath', () => {
  const same = (value: number) => value;

  it('runs straight from point to point, and parts where nothing is known', () => {
    const points = [{ x: 0, y: 1 }, { x: 1, y: 2 }, null, { x: 3, y: 4 }, { x: 4, y: 5 }];
    expect(curvePath(points, same, same)).toBe('M0 1L1 2M3 4L4 5');
    expect(curvePath([], same, same)).toBe('');
  });

  it('leaves out what a logarithmic axis has no place for', () => {
    const { place } = plotAxis({ label: '', domain: [1, 100], isLog: true }, [0, 200], 5);
    expect(
      curvePath(
        [
          { x: 1, y: 0 },
          { x: 10, y: 1 },
          { x: 100, y: 10 },
        ],
        place,
        place,
      ),
    ).toBe('M100 0L200 100');
  });
});

describe('plotAxis', () => {
  it('labels decades, thinned where there are many', () => {
    const { ticks, place } = plotAxis({ label: '', domain: [1e12, 1e21], isLog: true }, [0, 900], 5);
    expect(ticks.map(({ text }) => text)).toEqual(['10¹²', '10¹⁴', '10¹⁶', '10¹⁸', '10²⁰']);
    expect(place(1e13)).toBeCloseTo(100, 9);
  });

  it('writes decades near one as numbers', () => {
    const { ticks } = plotAxis({ label: '', domain: [1e-4, 3e4], isLog: true }, [0, 900], 9);
    expect(ticks.map(({ text }) => text)).toEqual([
      '10⁻⁴',
      '10⁻³',
      '0.01',
      '0.1',
      '1',
      '10',
      '100',
      '1000',
      '10⁴',
    ]);
  });

  it('refuses a logarithmic axis from nothing', () => {
    expect(() => plotAxis({ label: '', domain: [0, 1], isLog: true }, [0, 1], 5)).toThrow(RangeError);
  });
});
