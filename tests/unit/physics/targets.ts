import type { Target } from '@/lib/physics/target';

/** Uniform boron of 1e15, and targets of every other shape, for tests. */
export const BORON: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};

/** A drive-in of boron into n-type 1e15: 170.0 Ω/□. */
export const GAUSSIAN: Target = {
  ...BORON,
  quantity: 'sheet_resistance',
  profile: 'gaussian',
  densityPerCm3: 1e19,
  lengthUm: 0.5,
  backgroundDopant: 'phosphorus',
  backgroundDensityPerCm3: 1e15,
};

export const ERFC: Target = {
  ...GAUSSIAN,
  profile: 'erfc',
  dopant: 'phosphorus',
  densityPerCm3: 1e20,
  backgroundDopant: 'boron',
};

export const IMPLANT: Target = {
  ...GAUSSIAN,
  profile: 'implant',
  densityPerCm3: 3e18,
  rangeUm: 0.1,
  lengthUm: 0.04,
};

export const DRIVEN: Target = { ...IMPLANT, driveInC: 1000, driveInMin: 30 };

/** Phosphorus of 1e15, 10 µm, on boron 1e19: 8.96 µm conduct. */
export const EPI: Target = {
  ...BORON,
  quantity: 'sheet_resistance',
  dopant: 'phosphorus',
  lengthUm: 10,
  backgroundDopant: 'boron',
  backgroundDensityPerCm3: 1e19,
};

const depths = Array.from({ length: 60 }, (_, i) => (i * 2) / 59);

/** The gaussian as depths and densities. */
export const PAIRS: Target = {
  ...GAUSSIAN,
  profile: 'pairs',
  lengthUm: null,
  pairs: depths.map((depthUm) => ({ depthUm, densityPerCm3: 1e19 * Math.exp(-((depthUm / 0.5) ** 2)) })),
};
