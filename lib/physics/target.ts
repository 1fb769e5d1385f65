import type { Dopant } from './dopant';
import type { DepthDensity } from './pairs-shape';

/** What a step is meant to make of a wafer, and so what a probe should read on it. */
export interface Target {
  quantity: 'resistivity' | 'sheet_resistance';
  dopant: Dopant;
  /**
   * Per cm³: of a uniform layer or box; the peak of a gaussian, erfc or profile of pairs; of an implant the peak before
   * its drive-in (`peakOfDose`); at the seed end when `alongCrystal`.
   */
  densityPerCm3: number;
  /** Half-width of what is accepted, in percent of the density; null where none is agreed. */
  tolerancePercent: number | null;
  /** The density follows Scheil's law to the wafer's place in its crystal. */
  alongCrystal: boolean;
  profile: 'uniform' | 'box' | 'gaussian' | 'erfc' | 'implant' | 'pairs';
  /**
   * Thickness of a uniform layer or box, characteristic length of a gaussian or erfc, straggle of an implant; null for
   * pairs. A wafer may bring its own thickness of a uniform layer or box.
   */
  lengthUm: number | null;
  backgroundDopant: Dopant | null;
  backgroundDensityPerCm3: number | null;
  /** Measured over model, from a baseline; null where physics stands alone. */
  calibrationFactor: number | null;
  /** Standard uncertainty of the calibration factor, in percent. */
  calibrationPercent: number | null;
  /** A dopant of the other type in the same uniform silicon; both or neither. Along a crystal its density at the seed end. */
  counterDopant?: Dopant | null;
  counterDensityPerCm3?: number | null;
  /** Projected range of an implant. */
  rangeUm?: number | null;
  /** The drive-in after an implant; both or neither. */
  driveInC?: number | null;
  driveInMin?: number | null;
  /** The profile itself; it is scaled so that its highest density is `densityPerCm3`. */
  pairs?: readonly DepthDensity[] | null;
  /** The owner's own temperature coefficient, in percent per °C; absent: that of the silicon or the profile. */
  temperatureCoefficientPercentPerC?: number | null;
  /** How it is measured; absent: by a four-point probe, which needs a junction under a layer. */
  method?: 'four-point' | 'other' | null;
}

/** What one wafer brings to its own expected value. */
export interface ExpectedWafer {
  ingotFraction?: number | null;
  layerThicknessUm?: number | null;
}
