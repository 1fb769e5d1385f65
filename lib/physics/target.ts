import type { Dopant } from './dopant';

/** What a step is meant to make of a wafer, and so what a probe should read on it. */
export interface Target {
  quantity: 'resistivity' | 'sheet_resistance';
  dopant: Dopant;
  /** Per cm³: of a uniform layer or box; the peak of a gaussian or erfc; at the seed end when `alongCrystal`. */
  densityPerCm3: number;
  /** Half-width of what is accepted, in percent of the density; null where none is agreed. */
  tolerancePercent: number | null;
  /** The density follows Scheil's law to the wafer's place in its crystal. */
  alongCrystal: boolean;
  profile: 'uniform' | 'box' | 'gaussian' | 'erfc';
  /** Thickness of a uniform layer or box, characteristic length of a gaussian or erfc; a wafer may bring its own thickness. */
  lengthUm: number | null;
  backgroundDopant: Dopant | null;
  backgroundDensityPerCm3: number | null;
  /** Measured over model, from a baseline; null where physics stands alone. */
  calibrationFactor: number | null;
  /** Standard uncertainty of the calibration factor, in percent. */
  calibrationPercent: number | null;
}

/** What one wafer brings to its own expected value. */
export interface ExpectedWafer {
  ingotFraction?: number | null;
  layerThicknessUm?: number | null;
}
