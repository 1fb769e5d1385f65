import type { Figure } from '@/app/_ui/figures';
import {
  formatDensityPerCm3,
  formatNumber,
  formatPercent,
  formatReading,
  formatSignedPercent,
  formatWithUncertainty,
} from '@/lib/format';
import { isUniform } from '@/lib/physics/is-uniform';
import type { Expected } from '@/lib/physics/expected-value';
import { expectedBudget } from '@/lib/physics/expected-uncertainty';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { sensitivities } from '@/lib/physics/sensitivities';
import { sheetResistance } from '@/lib/physics/sheet-resistance';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { unitOf } from '@/lib/streams/types';
import { rangeWords } from './words';

/** The expected value with its standard uncertainty: "13.31 ± 0.23 Ω·cm". */
export function expectedWords(target: Target, { value, uncertaintyPercent }: Expected): string {
  return formatWithUncertainty(value, (value * uncertaintyPercent) / 100, unitOf(target.quantity));
}

/** How well an expected value is known, where it came from, and what is tolerated: the last stands apart. */
export function knownRows(target: Target, expected: Expected): Figure[] {
  const reading = (value: number | null) => formatReading(target.quantity, value);
  const { uncertaintyPercent, value } = expected;
  const rows: Figure[] = [
    { name: 'standard uncertainty', value: formatPercent(uncertaintyPercent) },
    {
      name: 'band, k = 2',
      value: rangeWords(
        value * (1 - uncertaintyPercent / 50),
        value * (1 + uncertaintyPercent / 50),
        reading,
      ),
      ink: 'expected',
      definition:
        'Twice the standard uncertainty to either side (JCGM 100:2008, 6.2). What is tolerated is no part of it.',
    },
  ];
  if (target.calibrationFactor !== null) {
    rows.push({ name: 'from physics', value: reading(expected.fromPhysics), ink: 'expected' });
    rows.push({ name: 'calibrated', value: reading(value), ink: 'expected' });
  }
  if (target.tolerancePercent !== null) {
    rows.push({
      name: 'at the tolerance',
      value: rangeWords(expected.toleranceLower, expected.toleranceUpper, reading),
    });
  }
  return rows;
}

/** What a percent and a degree are worth, each by analytic derivatives at the value itself. */
export function worthRows(target: Target, value: number, wafer: ExpectedWafer = {}): Figure[] {
  const { perPercentDopant, perMeasurementC, perPercentThickness, perDriveInC } = sensitivities(
    target,
    wafer,
  );
  const isDosed = target.quantity === 'sheet_resistance' && !isUniform(target);
  return [
    [`1 % more ${isDosed ? 'dose' : 'dopant'} reads`, perPercentDopant],
    ['a wafer 1 °C warmer reads', perMeasurementC],
    [
      target.quantity === 'resistivity' ? '1 % more thickness entered reads' : '1 % more thickness reads',
      perPercentThickness,
    ],
    ['a drive-in 1 °C hotter reads', perDriveInC],
  ].flatMap(([name, percent]): Figure[] => {
    if (typeof percent !== 'number') return [];
    return [
      {
        name,
        value: `${formatSignedPercent(percent, 2)}, ${signedReading(target, (percent / 100) * value)}`,
      },
    ];
  });
}

function signedReading(target: Target, difference: number): string {
  return `${difference < 0 ? '−' : '+'}${formatReading(target.quantity, Math.abs(difference), 3)}`;
}

/** What a graded layer holds beside its sheet resistance. */
export function layerRows(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): Figure[] {
  if (target.quantity === 'resistivity' || target.profile === 'uniform') return [];
  const { junctionDepthUm, dosePerCm2 } = sheetResistance(layerOfTarget(target, densityPerCm3, wafer));
  return [
    { name: 'peak as given', value: formatDensityPerCm3(densityPerCm3) },
    { name: 'junction at', value: `${formatNumber(junctionDepthUm)}\u00a0µm` },
    { name: 'dose in the silicon', value: formatDensityPerCm3(dosePerCm2).replace('cm⁻³', 'cm⁻²') },
  ];
}

/** The parts of the uncertainty, each with its bound and where it comes from. */
export function budgetRows(target: Target, wafer: ExpectedWafer = {}): Figure[] {
  return expectedBudget(target, wafer).parts.map((part) => ({
    name: part.isCommon ? `${part.name}, common to all wafers` : part.name,
    value:
      part.boundPercent === null
        ? formatPercent(part.standardPercent)
        : `±${formatNumber(part.boundPercent, 2)} % at most, ${formatPercent(part.standardPercent)}`,
    definition: part.source,
  }));
}
