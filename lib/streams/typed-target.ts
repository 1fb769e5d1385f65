import { z } from 'zod';
import type { Target } from '@/lib/physics/target';
import { targetFault } from './target-fault';
import { targetFields } from './target-fields';
import { GIVEN_FIELD, targetOfFields } from './target-of-fields';

/** A target as a form sends it. What physics cannot expect anything of is refused, in physics' own words. */
export function typedTarget(quantity: Target['quantity']) {
  return targetFields.transform((fields, context): Target => {
    const made = targetOfFields(quantity, fields);
    const fault = 'reason' in made ? made : targetFault(made);
    if (!('reason' in made) && fault === null) return made;
    const field = fault?.field === 'densityPerCm3' ? GIVEN_FIELD[fields.given] : fault?.field;
    context.addIssue({ code: 'custom', path: [field ?? 'densityPerCm3'], message: fault?.reason ?? '' });
    return z.NEVER;
  });
}
