import type { ImplantShape } from './layer';
import { normalShare } from './normal-share';

const ROOT_TWO_PI = Math.sqrt(2 * Math.PI);
/** A spread below this share of the straggle's square moves nothing that a number could hold. */
const NO_SPREAD = 1e-12;

/** An implant's density at one depth, over its peak as implanted, and how that changes per µm² of spread. */
export interface ImplantShare {
  share: number;
  slopePerUm2: number;
}

/**
 * The density of an implant at `depthUm`, as a share of its peak as implanted.
 *
 * As implanted: exp(−(x−R)²/2Δ²), what would lie above the surface being lost. After a drive-in of spread τ = 2·D·t the
 * exact solution of the diffusion equation with a surface that lets nothing through: with s = Δ² + τ,
 * Δ/√s·[exp(−(x−R)²/2s)·Φ(u₊) + exp(−(x+R)²/2s)·Φ(u₋)], u± = (R·τ ± x·Δ²)/(Δ·√(s·τ)).
 *
 * Throws nothing; the shape is checked where layers are.
 *
 * @example implantShare({ profile: 'implant', rangeUm: 0.1, lengthUm: 0.03, spreadUm2: 0 }, 0.1).share // 1
 */
export function implantShare(shape: ImplantShape, depthUm: number): ImplantShare {
  const { rangeUm: range, lengthUm: straggle, spreadUm2: spread } = shape;
  const s = straggle ** 2 + spread;
  const below = Math.exp((-0.5 * (depthUm - range) ** 2) / s);
  if (spread <= NO_SPREAD * straggle ** 2) {
    const curvature = (((depthUm - range) / straggle) ** 2 - 1) / straggle ** 2;
    return { share: below, slopePerUm2: 0.5 * curvature * below };
  }
  const width = straggle * Math.sqrt(s * spread);
  const mirrored = Math.exp((-0.5 * (depthUm + range) ** 2) / s);
  const part = (gaussian: number, distance: number, side: 1 | -1): ImplantShare => {
    const reach = range * spread + side * depthUm * straggle ** 2;
    const u = reach / width;
    const [phi, tail] = [normalShare(u), Math.exp(-0.5 * u * u) / ROOT_TWO_PI];
    const growth = distance ** 2 / (2 * s * s) - 1 / (2 * s);
    const slopeOfU = (range - (reach * (s + spread)) / (2 * spread * s)) / width;
    return { share: gaussian * phi, slopePerUm2: gaussian * (phi * growth + tail * slopeOfU) };
  };
  const [one, two] = [part(below, depthUm - range, 1), part(mirrored, depthUm + range, -1)];
  const height = straggle / Math.sqrt(s);
  return {
    share: height * (one.share + two.share),
    slopePerUm2: height * (one.slopePerUm2 + two.slopePerUm2),
  };
}
