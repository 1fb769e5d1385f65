/** A corner of a polygon, [x, y]. */
export type Corner = readonly [number, number];

/** Signed area of the triangle centre–a–b inside the disc of the given radius about the centre. */
function wedgeArea(a: Corner, b: Corner, radius: number): number {
  const [ax, ay] = a;
  const dx = b[0] - ax;
  const dy = b[1] - ay;
  const sector = (ux: number, uy: number, vx: number, vy: number) =>
    0.5 * radius * radius * Math.atan2(ux * vy - uy * vx, ux * vx + uy * vy);
  const squaredLength = dx * dx + dy * dy;
  if (squaredLength === 0) return 0;
  const half = -(ax * dx + ay * dy) / squaredLength;
  const discriminant = half * half - (ax * ax + ay * ay - radius * radius) / squaredLength;
  if (discriminant <= 0) return sector(ax, ay, b[0], b[1]);
  const root = Math.sqrt(discriminant);
  const from = Math.max(0, half - root);
  const to = Math.min(1, half + root);
  if (from >= to) return sector(ax, ay, b[0], b[1]);
  const px = ax + from * dx;
  const py = ay + from * dy;
  const qx = ax + to * dx;
  const qy = ay + to * dy;
  return sector(ax, ay, px, py) + 0.5 * (px * qy - py * qx) + sector(qx, qy, b[0], b[1]);
}

/**
 * The exact area that a polygon and a disc about the origin share: the signed sum, edge by edge, of
 * the circular sectors and triangles seen from the centre (elementary geometry). Corners in order,
 * either way round, the last not repeated; lengths in one unit, area in its square.
 *
 * @example polygonDiscArea([[0, 0], [2, 0], [0, 2]], 1) // a quarter disc, π/4
 */
export function polygonDiscArea(corners: readonly Corner[], radius: number): number {
  if (!(radius > 0)) throw new RangeError(`radius must be positive: ${radius}`);
  let area = 0;
  corners.forEach((corner, i) => {
    area += wedgeArea(corner, corners[(i + 1) % corners.length] ?? corner, radius);
  });
  return Math.abs(area);
}
