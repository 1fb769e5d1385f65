import { z } from 'zod';
import type { DepthDensity } from '@/lib/physics/pairs-shape';
import { numberTyped } from '@/lib/typed';

/** The most characters of a profile a form takes: two thousand depths fit. */
const MOST = 100_000;

/** A profile as a form holds it: a line for each depth, depth in µm and density per cm³; null when it is empty. */
export const typedPairs = z.preprocess(
  (value) => (typeof value === 'string' ? value.trim() : ''),
  z
    .string()
    .max(MOST, 'A profile has 2 to 2000 depths; this is longer.')
    .transform((text, context): readonly DepthDensity[] | null => {
      if (text === '') return null;
      const pairs: DepthDensity[] = [];
      for (const [i, line] of text.split('\n').entries()) {
        if (line.trim() === '') continue;
        const [depth = '', ...rest] = line.trim().split(/\s*[,;\t]\s*|\s+/);
        const [depthUm, densityPerCm3] = [numberTyped(depth), numberTyped(rest.join(' '))];
        if (depthUm === null || densityPerCm3 === null) {
          const message = `Line ${i + 1} is no depth and density: “${line.trim().slice(0, 40)}”. Write 0.25 3.1e18.`;
          context.addIssue({ code: 'custom', message });
          return z.NEVER;
        }
        pairs.push({ depthUm, densityPerCm3 });
      }
      return pairs;
    }),
);

/** A profile as `typedPairs` reads it. */
export function pairsText(pairs: readonly DepthDensity[]): string {
  return pairs.map(({ depthUm, densityPerCm3 }) => `${depthUm} ${densityPerCm3}`).join('\n');
}
