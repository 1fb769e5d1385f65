import type { Dopant } from './dopant';

/**
 * The self-consistency of the standard conversion, in percent of resistivity: 3 % for boron and 4.5 % for phosphorus,
 * stated in NBS Special Publication 400-64 (1981). For arsenic and antimony no figure is published: that of phosphorus
 * stands in as the least it can be.
 */
export function standardBoundPercent(dopant: Dopant): number {
  return dopant === 'boron' ? 3 : 4.5;
}

/**
 * The standard uncertainty (k = 1), in percent, of a resistivity from the standard conversion: `standardBoundPercent`
 * read as rectangular, divided by √3 (JCGM 100:2008, 4.3.7). It is common to every wafer of a stream: it moves the
 * expected value, not one wafer against the next.
 *
 * @example standardUncertaintyPercent('boron') // 1.732
 */
export function standardUncertaintyPercent(dopant: Dopant): number {
  return standardBoundPercent(dopant) / Math.sqrt(3);
}
