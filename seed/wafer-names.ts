import type { DemoStream } from './demo-stream';

/** How many single monitor wafers share a lot number. */
const WAFERS_A_LOT = 25;

/** The names of the nth wafer of a stream's subgroup `index`, in the manner of a line that counts what it makes. */
export function waferNames(
  stream: Pick<DemoStream, 'subgroup' | 'slots'>,
  index: number,
  nth: number,
): { lot: string | null; run: string | null; wafer: string; slot: number | null } {
  const number = (n: number, digits: number): string => String(n + 1).padStart(digits, '0');
  const slot = stream.slots[nth] ?? null;
  if (stream.subgroup === 'ingot')
    return { lot: `C${number(index, 4)}`, run: null, wafer: number(nth, 2), slot };
  if (stream.subgroup === 'run')
    return { lot: null, run: `R${number(index, 4)}`, wafer: number(nth, 2), slot };
  if (stream.subgroup === 'lot')
    return { lot: `L${number(index, 4)}`, run: null, wafer: number(nth, 2), slot };
  const lot = `M${number(Math.floor(index / WAFERS_A_LOT), 4)}`;
  return { lot, run: null, wafer: number(index % WAFERS_A_LOT, 2), slot };
}
