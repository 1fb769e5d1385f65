import { describe, expect, it } from 'vitest';
import { stripMarks } from '@/app/_charts/strip-marks';
import { stripPaths } from '@/app/_charts/strip-paths';
import { unscaledWords } from '@/app/_charts/strip-words';

const box = { width: 100, height: 30, slots: 5, inset: 5 };

describe('stripPaths', () => {
  it('is empty for no levels', () => {
    const paths = stripPaths(stripMarks([], box), box.height);
    expect(Object.values(paths).join('')).toBe('');
  });

  it('draws every mark once, in the path of its shape', () => {
    const points = [
      { z: 0, signal: false },
      { z: 1, signal: true },
      { z: 0, signal: false, open: true },
      { z: 0, signal: false, excluded: true },
      { z: 9, signal: true },
    ];
    const paths = stripPaths(stripMarks(points, box), box.height);
    const count = (d: string) => d.split('M').length - 1;
    expect(paths.dots).toBe('M5 15h0');
    expect(count(paths.diamonds)).toBe(2);
    expect(count(paths.rings)).toBe(1);
    expect(count(paths.crosses)).toBe(1);
    expect(count(paths.beyond)).toBe(1);
  });

  it('points up over a level beyond the top, and down under one beyond the bottom', () => {
    const of = (z: number) => stripPaths(stripMarks([{ z, signal: false }], box), box.height).beyond;
    expect(of(9)).toMatch(/l4-4l4 4$/);
    expect(of(-9)).toMatch(/l4 4l4-4$/);
  });

  it('begins a new piece of line after a gap', () => {
    const points = [1, 1, null, 1, 1].map((z) => ({ z, signal: false }));
    expect(stripPaths(stripMarks(points, box), box.height).lines.match(/M/g)).toHaveLength(2);
  });
});

describe('unscaledWords', () => {
  it('counts levels and says that there are no limits', () => {
    expect(unscaledWords([])).toBe('No levels yet');
    expect(unscaledWords([{ z: 0, signal: false }])).toBe('1 level, no limits yet');
    expect(
      unscaledWords([
        { z: 0, signal: false },
        { z: null, signal: false },
        { z: 1, signal: false },
      ]),
    ).toBe('2 levels, no limits yet');
  });
});
