import type { Dopant } from './dopant';
import { standardRange } from './standard-range';

/**
 * What a person should know about a figure from the standard conversion, in whole sentences: where data of
 * another dopant stand in, and where the accuracy is not established (ASTM F723 / SEMI MF723). Empty where there
 * is nothing to say.
 */
export function standardNotes(dopant: Dopant, densityPerCm3: number): string[] {
  const range = standardRange(dopant, densityPerCm3);
  if (range === null || dopant === 'boron' || dopant === 'phosphorus') return [];
  if (range.fit === 'phosphorus') {
    return [
      `Below 1e19 per cm³ the phosphorus conversion stands in for ${dopant}; its accuracy there is not established, so the uncertainty is the least it can be.`,
    ];
  }
  return [
    'The arsenic fit begins at 1e19 per cm³ with a step of about 4 % against the phosphorus one that serves below it; no accuracy is published, so the uncertainty is the least it can be.',
  ];
}
