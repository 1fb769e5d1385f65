import { streamCsv } from '../../../stream-csv';

const COLUMNS = [
  'revision',
  'in_force_from',
  'dopant',
  'density_per_cm3',
  'tolerance_percent',
  'along_crystal',
  'profile',
  'length_um',
  'background_dopant',
  'background_density_per_cm3',
  'calibration_factor',
  'calibration_percent',
  'calibration_wafers',
  'author',
  'reason',
  'created_at',
];

/** The revisions of a stream's target as a file. */
export const GET = streamCsv('targets', COLUMNS, (_actor, { targets }) =>
  targets.map((one) => [
    one.revision,
    one.effectiveFrom,
    one.target.dopant,
    one.target.densityPerCm3,
    one.target.tolerancePercent,
    one.target.alongCrystal,
    one.target.profile,
    one.target.lengthUm,
    one.target.backgroundDopant,
    one.target.backgroundDensityPerCm3,
    one.target.calibrationFactor,
    one.target.calibrationPercent,
    one.calibrationWafers,
    one.author,
    one.reason,
    one.createdAt,
  ]),
);
