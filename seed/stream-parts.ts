import { modelValue } from '@/lib/physics/model-value';
import type { Target } from '@/lib/physics/target';
import type { Cause, DemoSpecification, DemoStream, SpreadOverWafer } from './demo-stream';

/** A target with everything unsaid left out: a uniform resistivity without tolerance or calibration. */
export function plainTarget(part: Pick<Target, 'dopant' | 'densityPerCm3'> & Partial<Target>): Target {
  return {
    quantity: 'resistivity',
    tolerancePercent: null,
    alongCrystal: false,
    profile: 'uniform',
    lengthUm: null,
    backgroundDopant: null,
    backgroundDensityPerCm3: null,
    calibrationFactor: null,
    calibrationPercent: null,
    ...part,
  };
}

/** A cause with its variation from run to run and wafer to wafer, and its spread over the wafer. */
export function cause(runToRun: number, waferToWafer: number, spread: Partial<SpreadOverWafer> = {}): Cause {
  return { runToRun, waferToWafer, spread: { bowl: 0, rim: 0, tilt: 0, tiltDegrees: 0, ...spread } };
}

/** A cause that does nothing in this stream. */
export const NO_CAUSE: Cause = cause(0, 0);

/** A specification around what the step truly makes: percent for the mean and for each site, and an evenness. */
export function specificationAround(
  stream: Pick<DemoStream, 'target' | 'making'>,
  meanPercent: number,
  sitePercent: number,
  nonuniformityUpper: number,
): DemoSpecification {
  const nominal = stream.making.trueOverModel * modelValue(stream.target, stream.target.densityPerCm3);
  const at = (percent: number): number => Number((nominal * (1 + percent / 100)).toPrecision(3));
  return {
    meanLower: at(-meanPercent),
    meanUpper: at(meanPercent),
    siteLower: at(-sitePercent),
    siteUpper: at(sitePercent),
    nonuniformityMetric: 'relativeStandardDeviationPercent',
    nonuniformityUpper,
  };
}
