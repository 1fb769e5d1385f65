import type { PlanPart } from './plan-part';
import { fitCoefficients, fitResiduals } from './surface-fit';

/** One shape of a wafer, in percent of the mean of its good readings. */
export interface ShapeTerm {
  name: string;
  percent: number;
  standardError: number | null;
}

/** What a wafer looks like, and what the shapes leave unexplained, as a standard deviation. */
export interface WaferShape {
  terms: ShapeTerm[];
  residualPercent: number | null;
}

/** The shape of a wafer that has none: too few readings, or a mean that is not positive. */
export const NO_SHAPE: WaferShape = { terms: [], residualPercent: null };

/**
 * The least-squares shapes of the good readings on the unit disc (`SHAPE_TERMS` says what each is),
 * as many as the plan can tell apart, with the standard errors of ordinary least squares: the
 * residual spread times the root of the coefficient's unscaled variance. The level comes out near
 * 100 %: it differs from the mean as far as the sites are not even on the disc.
 */
export function waferShape(readings: Float64Array, part: PlanPart, mean: number | null): WaferShape {
  const fit = part.shapeFit;
  if (fit.terms.length === 0 || mean === null || mean <= 0) return NO_SHAPE;
  const coefficients = fitCoefficients(fit, readings);
  const residuals = fitResiduals(fit, readings, coefficients);
  let squares = 0;
  for (let i = 0; i < residuals.length; i++) squares += residuals[i]! * residuals[i]!;
  const freedom = residuals.length - fit.terms.length;
  const spread = freedom > 0 ? (100 * Math.sqrt(squares / freedom)) / mean : null;
  const terms = fit.terms.map(({ name }, k) => ({
    name,
    percent: (100 * coefficients[k]!) / mean,
    standardError: spread === null ? null : spread * Math.sqrt(fit.unscaledVariance[k]!),
  }));
  if (!terms.every((term) => Number.isFinite(term.percent)) || !Number.isFinite(spread ?? 0)) return NO_SHAPE;
  return { terms, residualPercent: spread };
}
