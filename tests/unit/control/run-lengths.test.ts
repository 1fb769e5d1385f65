import { describe, expect, it } from 'vitest';
import { absorbingChain } from '@/lib/control/absorbing-chain';
import { chartRunLength } from '@/lib/control/chart-run-length';
import { cusumRunLength } from '@/lib/control/cusum-run-length';
import { detectionCurve } from '@/lib/control/detection-curve';
import { ewmaRunLength, type EwmaDesign } from '@/lib/control/ewma-run-length';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleAutomaton } from '@/lib/control/rule-automaton';
import { ruleRunLength } from '@/lib/control/rule-run-length';
import { standardNormalCdf, standardNormalDensity } from '@/lib/stats/standard-normal';

const [beyond, twoOfThree, fourOfFive, eight] = WESTERN_ELECTRIC as [string, string, string, string];

describe('run lengths of the Western Electric rules', () => {
  // C. W. Champ and W. H. Woodall, Technometrics 29, 393 (1987), table 1.
  it.each<[string[], number, number]>([
    [[beyond], 0, 370.4],
    [[beyond, twoOfThree], 0, 225.44],
    [[beyond, fourOfFive], 0, 166.05],
    [[beyond, eight], 0, 152.73],
    [[...WESTERN_ELECTRIC], 0, 91.75],
    [[beyond], 1, 43.89],
    [[...WESTERN_ELECTRIC], 1, 9.22],
  ])('%j at a shift of %d are those of Champ and Woodall to 0.01', (rules, shift, published) => {
    expect(Math.abs(ruleRunLength(rules, { shift }) - published)).toBeLessThan(0.01);
  });

  it('of three sigma alone are one over the probability beyond, on either side of zero and at any spread', () => {
    for (const [shift, spread] of [
      [0, 1],
      [1.3, 1],
      [-1.3, 1],
      [0.5, 1.4],
    ] as const) {
      const outside = standardNormalCdf((-3 - shift) / spread) + standardNormalCdf((-3 + shift) / spread);
      expect(ruleRunLength([beyond], { shift, spread })).toBeCloseTo(1 / outside, 8);
    }
  });

  it('of eight on one side alone are those of the renewal formula, (1 − p⁸)/(p⁸·(1 − p)) with both sides at once', () => {
    // W. Feller, An Introduction to Probability Theory, volume 1, XIII.8: success runs of 8 or failure runs of 8.
    const p = 0.5;
    const oneSide = (1 - p ** 8) / (p ** 8 * (1 - p));
    expect(ruleRunLength([eight])).toBeCloseTo(oneSide / 2, 8);
  });

  it('do not depend on the order of rules or on the side of the shift', () => {
    const backwards = [...WESTERN_ELECTRIC].reverse();
    expect(ruleRunLength(backwards, { shift: 0.7 })).toBeCloseTo(
      ruleRunLength(WESTERN_ELECTRIC, { shift: -0.7 }),
      9,
    );
  });

  it('fit into 215 states, and from the steady state see a shift sooner', () => {
    expect(ruleAutomaton(WESTERN_ELECTRIC).states).toBe(215);
    expect(ruleRunLength(WESTERN_ELECTRIC, { shift: 1, start: 'steady' })).toBeLessThan(9.22);
    expect(ruleRunLength([beyond], { shift: 1, start: 'steady' })).toBeCloseTo(43.8947, 3);
  });

  it('are refused for trends, alternations, no rules and nonsense', () => {
    for (const rules of [['six-in-a-trend'], ['fourteen-alternating'], [], ['unheard-of']]) {
      expect(() => ruleRunLength(rules)).toThrow(RangeError);
    }
    expect(() => ruleRunLength([beyond], { shift: NaN })).toThrow(RangeError);
    expect(() => ruleRunLength([beyond], { spread: 0 })).toThrow(RangeError);
  });
});

/** Nodes and weights of Gauss and Legendre on −1 to 1 (Abramowitz and Stegun, 25.4.29). */
function gaussLegendre(n: number): { x: number; w: number }[] {
  return Array.from({ length: n }, (_, i) => {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 0;
    for (let step = 0; step < 50; step++) {
      let [p, before] = [1, 0];
      for (let k = 1; k <= n; k++) [p, before] = [((2 * k - 1) * x * p - (k - 1) * before) / k, p];
      slope = (n * (x * p - before)) / (x * x - 1);
      x -= p / slope;
    }
    return { x, w: 2 / ((1 - x * x) * slope * slope) };
  });
}

/** The integral equation of S. V. Crowder, Technometrics 29, 401 (1987), solved at Gauss points, from the target on. */
function crowder({ lambda, width }: EwmaDesign, shift: number): number {
  const h = width * Math.sqrt(lambda / (2 - lambda));
  const nodes = gaussLegendre(81);
  const kept = Float64Array.from(
    nodes.flatMap(({ x: from }) =>
      nodes.map(
        ({ x, w }) =>
          (w * h * standardNormalDensity((x * h - (1 - lambda) * from * h) / lambda - shift)) / lambda,
      ),
    ),
  );
  return absorbingChain(kept, nodes.length).steps()[40] ?? 0;
}

describe('run lengths of an EWMA', () => {
  const designs: EwmaDesign[] = [
    { lambda: 0.4, width: 3.054 },
    { lambda: 0.25, width: 2.998 },
    { lambda: 0.2, width: 2.962 },
    { lambda: 0.1, width: 2.814 },
    { lambda: 0.05, width: 2.615 },
  ];

  // J. M. Lucas and M. S. Saccucci, Technometrics 32, 1 (1990), as reprinted in textbooks (from memory).
  it.each([
    [0, [500, 500, 500, 500, 500]],
    [0.25, [224, 170, 150, 106, 84.1]],
    [0.5, [71.2, 48.2, 41.8, 31.3, 28.8]],
    [1, [14.3, 11.1, 10.5, 10.3, 11.4]],
    [2, [3.5, 3.6, 3.7, 4.4, 5.2]],
    [4, [1.4, 1.7, 1.9, 2.2, 2.7]],
  ])(
    'at a shift of %d are those of Lucas and Saccucci within the rounding of their table',
    (shift, table) => {
      designs.forEach((design, i) => {
        const published = table[i] ?? 0;
        const rounding = shift === 0 ? 0.5 : published >= 100 ? 0.51 : 0.101;
        expect(Math.abs(ewmaRunLength(design, { shift }) - published)).toBeLessThan(rounding);
      });
    },
  );

  it('agree with the integral equation of Crowder, solved another way, to 3e-4 of their value, at λ = 0.01 to 1.1e-3', () => {
    for (const design of [...designs, { lambda: 0.01, width: 2 }]) {
      const part = design.lambda < 0.05 ? 1.1e-3 : 3e-4;
      for (const shift of [0, 0.5, 1]) {
        const exact = crowder(design, shift);
        expect(Math.abs(ewmaRunLength(design, { shift }) - exact)).toBeLessThan(part * exact);
      }
    }
  });

  it('are those of three sigma when only the newest value counts', () => {
    for (const shift of [0, 1, 2.5]) {
      expect(ewmaRunLength({ lambda: 1, width: 3 }, { shift })).toBeCloseTo(
        ruleRunLength([beyond], { shift }),
        6,
      );
    }
  });

  it('are shorter from the steady state, and refused for nonsense', () => {
    const [, , , design] = designs as [EwmaDesign, EwmaDesign, EwmaDesign, EwmaDesign];
    const steady = ewmaRunLength(design, { shift: 1, start: 'steady' });
    expect(steady).toBeLessThan(ewmaRunLength(design, { shift: 1 }));
    for (const bad of [
      { lambda: 0, width: 3 },
      { lambda: 1.1, width: 3 },
      { lambda: 0.2, width: 0 },
      { lambda: 0.2, width: Infinity },
    ]) {
      expect(() => ewmaRunLength(bad)).toThrow(RangeError);
    }
    expect(() => ewmaRunLength(design, { shift: Infinity })).toThrow(RangeError);
    expect(() => ewmaRunLength({ lambda: 0.2, width: 30 })).toThrow(RangeError);
  });
});

/** D. Siegmund, Sequential Analysis, Springer 1985: one arm, with the overshoot of 1.166 added to h. */
function siegmund(drift: number, h: number): number {
  const b = h + 1.166;
  return drift === 0 ? b * b : (Math.exp(-2 * drift * b) + 2 * drift * b - 1) / (2 * drift * drift);
}

describe('run lengths of a CUSUM', () => {
  const shifts = [0, 0.25, 0.5, 0.75, 1, 1.5, 2, 2.5, 3, 4];

  // J. M. Lucas, J. Quality Technology 8, 1 (1976), two-sided with k = ½, as reprinted in textbooks (from memory).
  it.each([
    [4, [168, 74.2, 26.6, 13.3, 8.38, 4.75, 3.34, 2.62, 2.19, 1.71]],
    [5, [465, 139, 38.0, 17.0, 10.4, 5.75, 4.01, 3.11, 2.57, 2.01]],
  ])('with h = %d are those of Lucas within the rounding of his table', (decision, table) => {
    shifts.forEach((shift, i) => {
      const published = table[i] ?? 0;
      const rounding = published >= 100 ? 0.55 : published >= 10 ? 0.055 : 0.0055;
      expect(
        Math.abs(cusumRunLength({ reference: 0.5, decision }, { shift }) - published),
        `${shift}`,
      ).toBeLessThan(rounding);
    });
  });

  it('lie within a few percent of the approximation of Siegmund', () => {
    for (const [k, h, shift] of [
      [0.5, 4, 0],
      [0.25, 8, 0],
      [0.5, 5, 1],
      [0.25, 8, 0.5],
    ] as const) {
      const near = 1 / (1 / siegmund(shift - k, h) + 1 / siegmund(-shift - k, h));
      const length = cusumRunLength({ reference: k, decision: h }, { shift });
      expect(Math.abs(length / near - 1)).toBeLessThan(0.04);
    }
  });

  it('do not depend on the side of the shift, and stay finite where one arm never signals', () => {
    const design = { reference: 0.5, decision: 5 };
    expect(cusumRunLength(design, { shift: 4 })).toBeCloseTo(2.013, 3);
    for (const start of ['zero', 'steady'] as const) {
      const there = cusumRunLength(design, { shift: 0.8, start });
      expect(cusumRunLength(design, { shift: -0.8, start })).toBeCloseTo(there, 6);
    }
  });

  it('are refused for nonsense', () => {
    for (const bad of [
      { reference: -0.5, decision: 5 },
      { reference: 0.5, decision: 0 },
      { reference: NaN, decision: 5 },
      { reference: 3, decision: 40 },
    ]) {
      expect(() => cusumRunLength(bad)).toThrow(RangeError);
    }
  });
});

describe('what a chart can see', () => {
  it('falls from false signals towards one point as the shift grows, for each kind of chart', () => {
    for (const design of [
      { kind: 'rules', rules: WESTERN_ELECTRIC },
      { kind: 'ewma', lambda: 0.2, width: 2.962 },
      { kind: 'cusum', reference: 0.5, decision: 5 },
    ] as const) {
      const curve = detectionCurve(design, [0, 0.5, 1, 2, 3]).map(({ averageRunLength }) => averageRunLength);
      expect(curve).toEqual([...curve].sort((a, b) => b - a));
      expect(curve[0]).toBe(chartRunLength(design));
    }
  });

  it('never ends where no value can be beyond', () => {
    expect(() => absorbingChain(Float64Array.of(1), 1).steps()).toThrow(RangeError);
  });
});
