import { flatOffsetMm } from '@/lib/wafer/flat-offset-mm';

/**
 * The outline of a wafer as an SVG path around the centre, y downwards, in units of its radius times `size`:
 * a disc with a notch, or with its primary flat, at the bottom. The notch is drawn larger than it is, so that it is
 * seen. A flat whose length no standard gives is drawn at the usual share of the diameter.
 */
export function waferOutline(diameterMm: number, orientation: 'notch' | 'flat', size: number): string {
  const at = (angle: number, r = size) =>
    `${(r * Math.cos(angle)).toFixed(2)} ${(r * Math.sin(angle)).toFixed(2)}`;
  if (orientation === 'notch') {
    const half = 0.035;
    return `M${at(Math.PI / 2 + half)}A${size} ${size} 0 1 1 ${at(Math.PI / 2 - half)}L${at(Math.PI / 2, 0.95 * size)}Z`;
  }
  const offset = (flatOffsetMm(diameterMm) ?? 0.464 * diameterMm) / (diameterMm / 2);
  const half = Math.acos(offset);
  return `M${at(Math.PI / 2 + half)}A${size} ${size} 0 1 1 ${at(Math.PI / 2 - half)}Z`;
}
