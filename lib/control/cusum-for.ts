import { monotoneRoot } from '@/lib/physics/monotone-root';
import { cusumRunLength, type CusumDesign } from './cusum-run-length';
import { assertWanted, type Wanted } from './wanted';

/**
 * The CUSUM that sees the wanted shift soonest among those with the wanted mean number of points between false
 * signals: k is half the shift, the best there is in the sense of G. V. Moustakides, Ann. Statist. 14, 1379 (1986)
 * (from memory), and h what gives the wanted figure.
 *
 * Throws `RangeError` unless 10 ≤ inControl ≤ 100 000 and 0.1 ≤ |shift| ≤ 6.
 *
 * @example cusumFor({ inControl: 465, shift: 1 }) // k 0.5, h 5
 */
export function cusumFor(wanted: Wanted): CusumDesign {
  assertWanted(wanted);
  const reference = Math.abs(wanted.shift) / 2;
  const excess = (decision: number): number =>
    Math.log(cusumRunLength({ reference, decision }) / wanted.inControl);
  let high = 1;
  while (high < 50 && excess(high) < 0) high = Math.min(50, high * 2);
  const decision = monotoneRoot(excess, 1e-3, high, 1e-4);
  if (decision === null) throw new RangeError(`no decision interval gives ${wanted.inControl} points`);
  return { reference, decision };
}
