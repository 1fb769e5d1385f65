import type { Target } from '@/lib/physics/target';
import { pairsText } from './typed-pairs';

/** A target as the fields of its form hold it: what `typedTarget` makes of these words is the target. */
export function wordsOfTarget(target: Target): Record<string, string> {
  const { pairs, ...plain } = target;
  const filled = Object.entries(plain).filter(([, value]) => value !== null && value !== false);
  const words = Object.fromEntries(filled.map(([name, value]) => [name, String(value)]));
  return pairs ? { ...words, pairs: pairsText(pairs) } : words;
}
