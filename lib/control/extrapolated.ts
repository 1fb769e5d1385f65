/**
 * What an approximation over intervals tends to as they get ever narrower, from two numbers of intervals whose error
 * falls as the square of the width (L. F. Richardson, Phil. Trans. R. Soc. A 210, 307 (1911)).
 *
 * @example extrapolated((n) => 2 + 1 / n ** 2, 10, 20) // 2
 */
export function extrapolated(of: (intervals: number) => number, coarse: number, fine: number): number {
  const [first, second] = [of(coarse), of(fine)];
  return second + (second - first) / ((fine / coarse) ** 2 - 1);
}
