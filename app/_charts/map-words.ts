import type { Site } from '@/lib/wafer/site';

/** Where a site lies, in words: "in the centre", "at +x", "at -x, +y". */
export function siteInWords({ xMm, yMm }: Site, radiusMm: number): string {
  if (Math.hypot(xMm, yMm) < 0.1 * radiusMm) return 'in the centre';
  const steep = 0.4142 * Math.max(Math.abs(xMm), Math.abs(yMm));
  const parts: string[] = [];
  if (Math.abs(xMm) > steep) parts.push(xMm > 0 ? '+x' : '−x');
  if (Math.abs(yMm) > steep) parts.push(yMm > 0 ? '+y' : '−y');
  return `at ${parts.join(', ')}`;
}

/** What a map shows, for those who cannot see it. */
export function mapWords(
  title: string,
  good: readonly { site: Site; value: number }[],
  taken: { bad: number; excluded: number },
  radiusMm: number,
  text: (value: number) => string,
): string {
  const first = good[0];
  const out = [
    ...(taken.bad > 0 ? [`${taken.bad} ${taken.bad === 1 ? 'reading' : 'readings'} taken out`] : []),
    ...(taken.excluded > 0 ? [`${taken.excluded} in the edge exclusion`] : []),
  ];
  const tail = out.length > 0 ? `; ${out.join(', ')}` : '';
  if (first === undefined) return `${title}: no good reading${tail}`;
  const lowest = good.reduce((a, b) => (b.value < a.value ? b : a), first);
  const highest = good.reduce((a, b) => (b.value > a.value ? b : a), first);
  const place = ({ site }: { site: Site }) => siteInWords(site, radiusMm);
  return `${title}: ${good.length} good sites, lowest ${text(lowest.value)} ${place(lowest)}, highest ${text(highest.value)} ${place(highest)}${tail}`;
}
