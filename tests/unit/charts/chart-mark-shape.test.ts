import { describe, expect, it } from 'vitest';
import { chartMarkShape, completionsOf } from '@/app/_charts/chart-mark-shape';

const quiet = { completions: [], outOfSpecification: false, open: false, judged: true, hollow: false };

describe('chartMarkShape', () => {
  it('is a dot for an ordinary point', () => {
    expect(chartMarkShape(quiet, 'level')).toBe('dot');
  });

  it('is a diamond only on the chart whose pattern the point completes', () => {
    const point = { ...quiet, completions: ['within:beyond-limit:above'] };
    expect(chartMarkShape(point, 'within')).toBe('diamond');
    expect(chartMarkShape(point, 'level')).toBe('dot');
    expect(completionsOf(point, 'within')).toEqual(['within:beyond-limit:above']);
  });

  it('lets out of specification outrank every rule, on the level chart', () => {
    const point = { ...quiet, outOfSpecification: true, completions: ['level:beyond-3-sigma:above'] };
    expect(chartMarkShape(point, 'level')).toBe('ringed-diamond');
    expect(chartMarkShape(point, 'moving-range')).toBe('dot');
  });

  it('crosses what is left out and hollows what is open, late or measured again', () => {
    expect(chartMarkShape({ ...quiet, judged: false }, 'level')).toBe('cross');
    expect(chartMarkShape({ ...quiet, judged: false, open: true }, 'level')).toBe('ring');
    expect(chartMarkShape({ ...quiet, hollow: true }, 'level')).toBe('ring');
  });
});
