import type { MobilityModel } from '@/lib/physics/conduction-resistivity';
import { expectedBudget } from '@/lib/physics/expected-uncertainty';
import { possibleCauses, type PossibleCause } from '@/lib/physics/possible-causes';
import { sensitivities, type Sensitivities } from '@/lib/physics/sensitivities';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import type { UncertaintyBudget } from '@/lib/physics/uncertainty-budget';
import type { Circumstances } from './expect-question';

/** What stands beside an expected value: what moves it, how well it is known, what would explain a measured one. */
export interface Extras {
  sensitivities: Sensitivities | null;
  budget: UncertaintyBudget | null;
  causes?: PossibleCause[];
}

/** The budget of a target's value in the circumstances; null where not even its size is known. */
export function budgetIn(
  target: Target,
  circumstances: Circumstances,
  model: MobilityModel | null,
  wafer: ExpectedWafer = {},
): UncertaintyBudget {
  const { temperatureC, temperatureUncertaintyC, thicknessUncertaintyPercent } = circumstances;
  const isTemperature = model === null && (temperatureUncertaintyC !== null || temperatureC !== 23);
  return expectedBudget(target, wafer, {
    model,
    temperature: isTemperature ? { temperatureC, uncertaintyC: temperatureUncertaintyC ?? 0 } : null,
    thicknessPercent: thicknessUncertaintyPercent,
  });
}

/** The extras of a target's value `expected`, in the unit and at the temperature of what was measured. */
export function extras(
  target: Target,
  expected: number,
  circumstances: Circumstances,
  budget: UncertaintyBudget | null,
): Extras {
  const moved = sensitivities(target);
  const { measured } = circumstances;
  if (measured === null) return { sensitivities: moved, budget };
  if (!(measured > 0)) throw new RangeError(`A measured value is positive, not ${measured}.`);
  return {
    sensitivities: moved,
    budget,
    causes: possibleCauses(measured / expected, budget?.standardPercent ?? 0, moved),
  };
}
