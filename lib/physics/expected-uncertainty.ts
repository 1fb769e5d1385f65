import { COMPENSATED_MODEL, isCompensated } from './compensated-target';
import type { MobilityModel } from './conduction-resistivity';
import { isImplantedOrDiffused } from './is-implanted-or-diffused';
import { modelSpreadPercent } from './model-spread';
import { standardBoundPercent } from './standard-bound';
import type { ExpectedWafer, Target } from './target';
import { temperatureParts, type MeasuredTemperature } from './temperature-parts';
import {
  boundedPart,
  combinedBudget,
  normalPart,
  type UncertaintyBudget,
  type UncertaintyPart,
} from './uncertainty-budget';
import { sensitivities } from './sensitivities';

/** How far the absolute sheet resistance of a made layer misses in practice, in percent (common practice, no source). */
const LAYER_BOUND_PERCENT = 20;

/** What is known of one measurement beside its value; what is absent brings no part. */
export interface KnownOfMeasurement {
  /** A mobility model that stands in for the standard conversion. */
  model?: MobilityModel | null;
  temperature?: MeasuredTemperature | null;
  /** Standard uncertainty of the thickness, in percent of it. */
  thicknessPercent?: number | null;
}

function modelParts(target: Target, model: MobilityModel | null): UncertaintyPart[] {
  const { calibrationFactor, calibrationPercent, dopant } = target;
  if (calibrationFactor !== null && calibrationPercent !== null) {
    return [
      normalPart(
        'calibration',
        calibrationPercent,
        true,
        'a baseline; it takes up the bias of the conversion',
      ),
    ];
  }
  const conversion =
    model === null
      ? boundedPart(
          'conversion',
          standardBoundPercent(dopant),
          true,
          'ASTM F723, self-consistency of NBS SP 400-64 (1981)',
        )
      : boundedPart(
          `${model} model`,
          modelSpreadPercent(model, dopant),
          true,
          'its largest difference from NBS SP 400-64 (1981) at 300 K',
        );
  if (calibrationFactor !== null || !isImplantedOrDiffused(target)) return [conversion];
  const activation = boundedPart(
    'activation and loss of dopant',
    LAYER_BOUND_PERCENT,
    true,
    'common practice, no source: layers miss by 5 to 20 %',
  );
  return [conversion, activation];
}

/** The model of a target that the standard conversion does not know: compensated silicon. */
function standIn(target: Target): MobilityModel | null {
  return isCompensated(target) ? COMPENSATED_MODEL : null;
}

/**
 * The uncertainty of a target's expected value, part by part (JCGM 100:2008): the conversion's self-consistency as a
 * rectangular bound, or the model's spread where one stands in; for implanted and diffused layers the 20 % by which
 * they miss; in place of these a calibration, which has taken up the bias; and what the measurement brings, the
 * wafer's temperature and thickness through their sensitivities.
 *
 * The target's tolerance is no part of it (JCGM 106:2012). Throws RangeError where the sensitivities asked for do.
 *
 * @example expectedBudget(boron 1e15).standardPercent // 1.732
 */
export function expectedBudget(
  target: Target,
  wafer: ExpectedWafer = {},
  known: KnownOfMeasurement = {},
): UncertaintyBudget {
  const parts = modelParts(target, known.model ?? standIn(target));
  if (known.temperature) parts.push(...temperatureParts(target, known.temperature, wafer));
  const thickness = known.thicknessPercent ?? null;
  if (thickness !== null) {
    const perPercent = sensitivities(target, wafer).perPercentThickness;
    if (perPercent !== null) {
      parts.push(
        normalPart(
          'thickness',
          Math.abs(perPercent) * thickness,
          false,
          'its sensitivity times what is not known of it',
        ),
      );
    }
  }
  return combinedBudget(parts);
}

/**
 * The standard uncertainty (k = 1), in percent, of a target's expected value at 23 °C: that of its budget, all of it
 * common to the wafers of a stream.
 *
 * @example a uniform boron target without calibration // 1.732
 */
export function expectedUncertaintyPercent(target: Target): number {
  return combinedBudget(modelParts(target, standIn(target))).standardPercent;
}
