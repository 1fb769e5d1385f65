/** What one point of a stream's charts is. */
export type SubgroupWord = 'wafer' | 'run' | 'lot' | 'ingot';

/**
 * A subgroup's key as people say it: "run R0042", "lot L0007", "ingot C0012"; of single wafers the carrier and the
 * wafer, "wafer M0003/07", without the time of measurement that tells one measurement of it from the next.
 *
 * @example subgroupLabel('wafer', 'M0003/07/2031-04-05T06:07:00.000Z') // 'wafer M0003/07'
 */
export function subgroupLabel(kind: SubgroupWord, key: string): string {
  if (kind !== 'wafer') return `${kind} ${key}`;
  const name = key
    .slice(0, Math.max(0, key.lastIndexOf('/')))
    .replace(/^\/(?!\/)/, '')
    .replaceAll('//', '/');
  return `wafer ${name === '' ? key : name}`;
}
