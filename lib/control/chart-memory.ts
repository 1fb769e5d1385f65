import type { ChartPoint } from './completions-at';
import { CUSUM_BEGIN, nextCusum, type CusumState } from './cusum';
import type { CusumDesign } from './cusum-run-length';
import { ewmaBegin, ewmaSigma, nextEwma, type EwmaState } from './ewma';
import type { EwmaDesign } from './ewma-run-length';
import { isBeyond } from './is-beyond';

/** Charts of levels that remember, beside the rules; null where a stream has none. */
export interface MemoryDesigns {
  ewma: EwmaDesign | null;
  cusum: CusumDesign | null;
}

/** What such charts know after a point, all in σ of the limits in force; `regime` null before any limits. */
export interface ChartMemory {
  regime: string | null;
  ewma: EwmaState;
  cusum: CusumState;
}

export const MEMORY_BEGIN: ChartMemory = { regime: null, ewma: ewmaBegin(0), cusum: CUSUM_BEGIN };

/**
 * The memory after one more point. It begins afresh with a regime, as rules do, and at a point without limits.
 *
 * Throws `RangeError` when the level is not finite, or the limits leave no room for a σ.
 */
export function nextMemory(
  before: ChartMemory,
  { level, limits, regime }: Pick<ChartPoint, 'level' | 'limits' | 'regime'>,
  designs: MemoryDesigns,
): ChartMemory {
  if (!Number.isFinite(level)) throw new RangeError(`no level of ${level}`);
  if (!limits) return MEMORY_BEGIN;
  if (!(limits.level.sigma > 0)) throw new RangeError('limits without room judge nothing');
  const { ewma, cusum } = before.regime === regime ? before : MEMORY_BEGIN;
  const z = (level - limits.level.centre) / limits.level.sigma;
  return {
    regime,
    ewma: designs.ewma ? nextEwma(ewma, z, designs.ewma.lambda) : ewma,
    cusum: designs.cusum ? nextCusum(cusum, z, designs.cusum) : cusum,
  };
}

/** A chart beyond its limit after a point, and the side to which the level lies. */
export interface MemorySignal {
  chart: 'ewma' | 'cusum';
  side: 'above' | 'below';
}

/** The signals that the memory after a point gives: EWMA by steady limits, CUSUM by its decision interval. */
export function memorySignals({ ewma, cusum }: ChartMemory, designs: MemoryDesigns): MemorySignal[] {
  const found: MemorySignal[] = [];
  if (designs.ewma) {
    const limit = designs.ewma.width * ewmaSigma(designs.ewma.lambda, null);
    if (isBeyond(ewma.value, limit, 'above')) found.push({ chart: 'ewma', side: 'above' });
    if (isBeyond(ewma.value, -limit, 'below')) found.push({ chart: 'ewma', side: 'below' });
  }
  for (const side of designs.cusum ? (['above', 'below'] as const) : []) {
    if (designs.cusum && isBeyond(cusum[side], designs.cusum.decision, 'above'))
      found.push({ chart: 'cusum', side });
  }
  return found;
}
