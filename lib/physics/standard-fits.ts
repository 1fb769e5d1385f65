import { polynomial } from './polynomial';
import { polynomialSlope } from './polynomial-slope';

/** One published fit of resistivity, in Ω·cm, against dopant density, per cm³, with its slope d ln ρ/d ln N. */
export interface ResistivityFit {
  resistivity(densityPerCm3: number): number;
  slope(densityPerCm3: number): number;
}

/** 1/q in 1/C as the published fit of phosphorus writes it. */
const RECIPROCAL_CHARGE = 6.242e18;

/** `ρ = light/N + heavy/(N·(1 + (N/reference)^−power))`, the form of the boron fits. */
export function boronFit(
  light: number,
  heavy: number,
  referencePerCm3: number,
  power: number,
): ResistivityFit {
  return {
    resistivity: (n) => (light + heavy / (1 + (n / referencePerCm3) ** -power)) / n,
    slope(n) {
      const u = (n / referencePerCm3) ** -power;
      return -1 + (heavy * power * u) / (1 + u) ** 2 / (light + heavy / (1 + u));
    },
  };
}

/** `ρ = 6.242e18·10^z/N`, z a ratio of polynomials in log10 N − 16: the form of the phosphorus fits. */
export function phosphorusFit(above: readonly number[], below: readonly number[]): ResistivityFit {
  return {
    resistivity(n) {
      const x = Math.log10(n) - 16;
      return (RECIPROCAL_CHARGE * 10 ** (polynomial(above, x) / polynomial(below, x))) / n;
    },
    slope(n) {
      const x = Math.log10(n) - 16;
      const [a, b] = [polynomial(above, x), polynomial(below, x)];
      return (polynomialSlope(above, x) * b - a * polynomialSlope(below, x)) / (b * b) - 1;
    },
  };
}

const ARSENIC = [
  -6633.667, 768.2531, -25.77373, 0.9658177, -0.05643443, -8.008543e-4, 9.055838e-5, -1.776701e-6,
  1.953279e-7, -5.754599e-9, -1.31657e-11,
];

/**
 * The fits at 23 °C. Source: ASTM F723 / SEMI MF723, after Thurber, Mattis, Liu and Filliben, NBS Special Publication
 * 400-64 (1981). Which serves which dopant, and where: `standardRanges`.
 */
export const FITS_AT_23C: Readonly<Record<'boron' | 'phosphorus' | 'arsenic', ResistivityFit>> = {
  boron: boronFit(1.305e16, 1.133e17, 1 / 2.58e-19, 0.737),
  phosphorus: phosphorusFit([-3.0769, 2.2108, -0.62272, 0.057501], [1, -0.68157, 0.19833, -0.018376]),
  arsenic: {
    resistivity: (n) => 10 ** polynomial(ARSENIC, Math.log10(n)),
    slope: (n) => polynomialSlope(ARSENIC, Math.log10(n)),
  },
};
