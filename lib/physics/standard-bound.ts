import type { Dopant } from './dopant';

/**
 * The self-consistency of the standard conversion, in percent of resistivity: 3 % for boron and 4.5 % for phosphorus,
 * stated in NBS Special Publication 400-64 (1981). For arsenic and antimony no figure is published: that of phosphorus
 * stands in as the least it can be.
 *
 * A bound, to be read as rectangular (JCGM 100:2008, 4.3.7), and common to every wafer of a stream: it moves the expected
 * value, not one wafer against the next.
 *
 * @example standardBoundPercent('boron') // 3
 */
export function standardBoundPercent(dopant: Dopant): number {
  return dopant === 'boron' ? 3 : 4.5;
}
