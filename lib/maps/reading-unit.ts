import type { Stream } from '@/lib/streams/types';
import { unitOf } from '@/lib/streams/types';

/** The unit a wafer's readings are shown in; a reading over `scale` is in it. */
export interface ReadingUnit {
  unit: string;
  scale: number;
}

/**
 * The unit people say for readings of this size, one for all of a page: mΩ·cm, Ω·cm, kΩ·cm, and the same of Ω/□.
 *
 * @example readingUnit('sheet_resistance', 1701.56) // { unit: 'kΩ/□', scale: 1000 }
 */
export function readingUnit(quantity: Stream['quantity'], typical: number | null): ReadingUnit {
  const unit = unitOf(quantity);
  if (typical === null || typical <= 0) return { unit, scale: 1 };
  if (typical < 1) return { unit: `m${unit}`, scale: 1e-3 };
  return typical < 1000 ? { unit, scale: 1 } : { unit: `k${unit}`, scale: 1000 };
}
