import { checkedBackground } from './checked-background';
import { complementaryErrorFunction } from './complementary-error-function';
import { implantShare } from './implant-share';
import type { DepthShare, ImplantShape, Layer } from './layer';
import { monotoneRoot } from './monotone-root';

/** Where a layer begins and ends, in µm below the surface; `topUm` is 0 unless it is buried. */
export interface LayerExtent {
  topUm: number;
  junctionUm: number;
}

const NONE = 'The layer has no junction with its background: it is nowhere heavier.';

function root(f: (depth: number) => number, from: number, to: number, scale: number): number {
  const found = monotoneRoot(f, from, to, 1e-13 * scale);
  if (found === null) throw new RangeError(NONE);
  return found;
}

/** The depth of an implant's peak after its drive-in: between the surface and its range, with one top only. */
function implantModeUm(shape: ImplantShape): number {
  if (shape.spreadUm2 === 0) return shape.rangeUm;
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [0, shape.rangeUm];
  for (let step = 0; step < 60; step++) {
    const [x, y] = [high - golden * (high - low), low + golden * (high - low)];
    if (implantShare(shape, x).share < implantShare(shape, y).share) low = x;
    else high = y;
  }
  return (low + high) / 2;
}

/** The highest density of an implant over its peak before the drive-in: 1 as implanted, less afterwards. */
export function implantPeakShare(shape: ImplantShape): number {
  return implantShare(shape, implantModeUm(shape)).share;
}

function implantExtent(shape: ImplantShape, lnRatio: number): LayerExtent {
  const excess = (depth: number): number => {
    const { share } = implantShare(shape, depth);
    return share > 0 ? Math.log(share) + lnRatio : -1e3;
  };
  const mode = implantModeUm(shape);
  if (!(excess(mode) > 0)) throw new RangeError(NONE);
  const width = Math.sqrt(shape.lengthUm ** 2 + shape.spreadUm2);
  const far = shape.rangeUm + width * (Math.sqrt(2 * lnRatio) + 3);
  return {
    topUm: excess(0) >= 0 ? 0 : root(excess, 0, mode, width),
    junctionUm: root(excess, mode, far, width),
  };
}

function pairsExtent(steps: readonly DepthShare[], lnFloor: number): LayerExtent {
  const start = steps.findIndex(({ lnShare }) => lnShare > lnFloor);
  const crossing = (a: DepthShare, b: DepthShare): number =>
    a.depthUm + ((lnFloor - a.lnShare) / (b.lnShare - a.lnShare)) * (b.depthUm - a.depthUm);
  const [first, before] = [steps[start], steps[start - 1]];
  if (first === undefined) throw new RangeError(NONE);
  const topUm = before === undefined ? 0 : crossing(before, first);
  let last = first;
  for (const step of steps.slice(start + 1)) {
    if (step.lnShare <= lnFloor) return { topUm, junctionUm: crossing(last, step) };
    last = step;
  }
  return { topUm, junctionUm: last.depthUm };
}

/**
 * From where to where a layer is heavier than its background, from the surface down to the first junction: the part
 * that conducts above it. For a box its thickness; a profile of pairs that never meets its background ends at its last
 * depth.
 *
 * Throws RangeError where `checkedBackground` does, and where there is no such part.
 *
 * @example layerExtent(gaussian of 1e19 with L = 0.5 µm in 1e15 of the other type).junctionUm // 1.517
 */
export function layerExtent(layer: Layer): LayerExtent {
  const background = checkedBackground(layer);
  if (layer.profile === 'box') return { topUm: 0, junctionUm: layer.lengthUm };
  if (layer.profile === 'pairs') {
    return pairsExtent(
      layer.steps,
      background === 0 ? -Infinity : Math.log(background / layer.peakDensityPerCm3),
    );
  }
  const lnRatio = Math.log(layer.peakDensityPerCm3 / background);
  if (layer.profile === 'implant') return implantExtent(layer, lnRatio);
  const gaussian = Math.sqrt(lnRatio);
  if (layer.profile === 'gaussian') return { topUm: 0, junctionUm: layer.lengthUm * gaussian };
  // erfc(u) ≤ exp(−u²), so the root lies no deeper than the gaussian's.
  const u = root((x) => Math.log(complementaryErrorFunction(x)) + lnRatio, 0, gaussian, 1);
  return { topUm: 0, junctionUm: layer.lengthUm * u };
}
