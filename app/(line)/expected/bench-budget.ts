import { expectedBudget } from '@/lib/physics/expected-uncertainty';
import type { Target } from '@/lib/physics/target';
import type { UncertaintyBudget } from '@/lib/physics/uncertainty-budget';
import type { BenchQuestion } from './bench-question';

/** The budget of what the bench was asked, with what is known of the wafer's temperature and thickness. Null where a model ends. */
export function benchBudget(target: Target, question: BenchQuestion): UncertaintyBudget | null {
  const { wafer, temperatureC, knownC, knownPercent } = question;
  const isElsewhere = temperatureC !== 23 || knownC !== null;
  try {
    return expectedBudget(target, wafer, {
      ...(isElsewhere && { temperature: { temperatureC, uncertaintyC: knownC ?? 0 } }),
      ...(knownPercent !== null && { thicknessPercent: knownPercent }),
    });
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
