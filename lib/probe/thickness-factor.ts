/**
 * How much a wafer that is thick against the pin spacing lowers the resistivity factor, insulated back:
 * (2·ln 2/u)/(1 + 4·Σ[(1 + (2nu)²)^−½ − (4 + (2nu)²)^−½]) with u = thickness over spacing.
 *
 * ρ = (V/I)·thickness·(π/ln 2)·factor. The image series of L. B. Valdes, Proc. IRE 42, 420 (1954), as in F. M.
 * Smits, Bell Syst. Tech. J. 37, 711 (1958); the far terms are summed as an integral. Below u = 0.1 the factor is 1
 * within 1e-12 and is returned as such.
 *
 * `thicknessOverSpacing` a positive number. Throws RangeError otherwise.
 *
 * @example thicknessFactor(0.5) // 0.9974
 */
export function thicknessFactor(thicknessOverSpacing: number): number {
  const u = thicknessOverSpacing;
  if (!(u > 0 && Number.isFinite(u))) {
    throw new RangeError(`Thickness over spacing is a positive number, not ${u}.`);
  }
  if (u < 0.1) return 1;
  const terms = Math.ceil(100 / u);
  let sum = 0;
  for (let n = terms; n >= 1; n--) {
    const square = (2 * n * u) ** 2;
    sum += 1 / Math.sqrt(1 + square) - 1 / Math.sqrt(4 + square);
  }
  const from = (2 * terms + 1) * u;
  sum += (Math.LN2 - (Math.asinh(from) - Math.asinh(from / 2))) / (2 * u);
  return (2 * Math.LN2) / u / (1 + 4 * sum);
}
