import { formatDensityPerCm3, formatNumber, formatReading, formatSignedPercent } from '@/lib/format';
import type { Target } from '@/lib/physics/target';
import type { NonuniformityMetric, Specification, Stream } from '@/lib/streams/types';

export const KIND_WORDS: Record<Stream['kind'], string> = {
  substrate: 'substrate',
  crystal: 'crystal, wafers along an ingot',
  epi: 'epitaxial layer',
  implant: 'implanted layer',
  diffusion: 'diffused layer',
};

export const QUANTITY_WORDS: Record<Target['quantity'], string> = {
  resistivity: 'resistivity, Ω·cm',
  sheet_resistance: 'sheet resistance, Ω/□',
};

export const PROFILE_WORDS: Record<Target['profile'], string> = {
  uniform: 'uniform',
  box: 'box over its junction',
  gaussian: 'gaussian (drive-in of a fixed dose)',
  erfc: 'erfc (constant source)',
  implant: 'implant (dose, range and straggle)',
  pairs: 'profile of depths and densities',
};

export const SUBGROUP_WORDS: Record<Stream['subgroup'], string> = {
  wafer: 'one wafer',
  run: 'a run',
  lot: 'a lot',
  ingot: 'an ingot',
};

export const STATISTIC_WORDS: Record<Stream['controlStatistic'], string> = {
  areaMean: 'area mean',
  mean: 'mean of the sites',
  median: 'median',
};

export const CHARTED_WORDS: Record<Stream['chartedValue'], string> = {
  statistic: 'the control statistic itself',
  relative: '100·ln(measured/expected), in percent',
};

export const SCREEN_WORDS: Record<Stream['screening'], string> = {
  outliers: 'impossible readings and outliers are taken out',
  impossible: 'impossible readings alone are taken out',
  off: 'nothing is taken out',
};

export const METRIC_WORDS: Record<NonuniformityMetric, string> = {
  relativeStandardDeviationPercent: 'relative s',
  fullRangeOverMidrangePercent: 'full range over mid-range',
  halfRangeOverMidrangePercent: 'half range over mid-range',
  halfRangeOverMeanPercent: 'half range over mean',
  radialVariationPercent: 'radial variation',
};

/** A setting as it was entered, without digits that nobody typed. */
function plain(value: number): string {
  return String(Number(value.toPrecision(6)));
}

/** A target in one line: "phosphorus, 1.00 × 10¹⁵ cm⁻³ ± 5 %, uniform, 12 µm". */
export function targetWords(target: Target): string {
  const counter = target.counterDopant;
  const density =
    formatDensityPerCm3(target.densityPerCm3) +
    (target.tolerancePercent === null ? '' : ` ± ${plain(target.tolerancePercent)} %`);
  return [
    target.dopant,
    target.alongCrystal ? `${density} at the seed end` : density,
    counter != null && `with ${counter} ${formatDensityPerCm3(target.counterDensityPerCm3 ?? null)}`,
    target.profile === 'pairs' ? `profile of ${target.pairs?.length ?? 0} depths` : target.profile,
    target.rangeUm != null && `range ${plain(target.rangeUm)} µm`,
    target.lengthUm !== null &&
      `${target.profile === 'implant' ? 'straggle ' : ''}${plain(target.lengthUm)} µm`,
    target.driveInC != null && `${plain(target.driveInC)} °C for ${plain(target.driveInMin ?? 0)} min`,
    target.backgroundDopant !== null &&
      `on ${target.backgroundDopant} ${formatDensityPerCm3(target.backgroundDensityPerCm3)}`,
    target.method === 'other' && 'not by four-point probe',
    target.temperatureCoefficientPercentPerC != null &&
      `${formatSignedPercent(target.temperatureCoefficientPercentPerC, 3)} per °C`,
    target.calibrationFactor !== null && `factor ${formatNumber(target.calibrationFactor, 4)}`,
  ]
    .filter((part) => part !== false)
    .join(', ');
}

/** Two limits of which either may be missing, their unit said once: "4.3 to 5.1 Ω·cm", "up to 3 %", "—". */
export function rangeWords(
  lower: number | null,
  upper: number | null,
  format: (value: number) => string,
): string {
  if (lower !== null && upper !== null) {
    const [least = '', unit] = format(lower).split('\u00a0');
    const most = format(upper);
    return `${most.endsWith(`\u00a0${unit}`) ? least : format(lower)} to ${most}`;
  }
  if (lower !== null) return `from ${format(lower)}`;
  return upper === null ? '—' : `up to ${format(upper)}`;
}

/** A specification in one line. */
export function specificationWords(specification: Specification, quantity: Target['quantity']): string {
  const reading = (value: number) => formatReading(quantity, value);
  const { meanLower, meanUpper, siteLower, siteUpper, nonuniformityMetric, nonuniformityUpper } =
    specification;
  const parts = [
    (meanLower ?? meanUpper) !== null && `wafer ${rangeWords(meanLower, meanUpper, reading)}`,
    (siteLower ?? siteUpper) !== null && `each site ${rangeWords(siteLower, siteUpper, reading)}`,
    nonuniformityMetric !== null &&
      `${METRIC_WORDS[nonuniformityMetric]} up to ${plain(nonuniformityUpper ?? 0)} %`,
  ].filter((part) => part !== false);
  return parts.length === 0 ? 'nothing is specified' : parts.join('; ');
}
