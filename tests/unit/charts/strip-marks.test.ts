import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { STRIP_REACH, type StripPoint, stripMarks, stripY } from '@/app/_charts/strip-marks';

const box = { width: 100, height: 30, slots: 5, inset: 5 };
const level = (z: number | null, more: Partial<StripPoint> = {}): StripPoint => ({
  z,
  signal: false,
  ...more,
});

describe('stripMarks', () => {
  it('draws nothing for no levels', () => {
    expect(stripMarks([], box)).toEqual({ marks: [], lines: [] });
  });

  it('puts a single level at the right end on the centre line, without a segment', () => {
    expect(stripMarks([level(0)], box)).toEqual({
      marks: [{ x: 95, y: 15, shape: 'dot', beyond: false }],
      lines: [],
    });
  });

  it('keeps few levels to the right, one slot apart', () => {
    expect(stripMarks([level(0), level(0)], box).marks.map((mark) => mark.x)).toEqual([72.5, 95]);
  });

  it('leaves a gap a gap', () => {
    const strip = stripMarks([level(1), level(1), level(null), level(1), level(1)], box);
    expect(strip.marks).toHaveLength(4);
    expect(strip.lines).toHaveLength(2);
  });

  it('crosses an excluded level, keeps it out of the line, and does not call it a signal', () => {
    const strip = stripMarks([level(0), level(9, { excluded: true, signal: true }), level(0)], box);
    expect(strip.marks[1]?.shape).toBe('cross');
    expect(strip.lines).toEqual(['50,15 95,15']);
  });

  it('tells signals and open levels by shape', () => {
    const shapes = stripMarks([level(0, { signal: true }), level(0, { open: true })], box).marks;
    expect(shapes.map((mark) => mark.shape)).toEqual(['diamond', 'ring']);
  });

  it('says when a level lies beyond the drawing, and keeps its mark inside', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), (z) => {
        const mark = stripMarks([level(z)], box).marks[0];
        expect(mark?.beyond).toBe(Math.abs(z) > STRIP_REACH);
        expect(mark?.y).toBeGreaterThanOrEqual(0);
        expect(mark?.y).toBeLessThanOrEqual(30);
      }),
    );
  });

  it('refuses more levels than slots and levels that are not finite', () => {
    expect(() =>
      stripMarks(
        Array.from({ length: 6 }, () => level(0)),
        box,
      ),
    ).toThrow(RangeError);
    expect(() => stripMarks([level(Number.NaN)], box)).toThrow(RangeError);
  });
});

describe('stripY', () => {
  it('draws higher levels higher', () => {
    expect(stripY(3, 56)).toBeCloseTo(13);
    expect(stripY(-3, 56)).toBeCloseTo(43);
  });
});
