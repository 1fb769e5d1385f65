import type { Target } from '@/lib/physics/target';

/** What may be known of a dopant. */
export const GIVEN_WORDS = {
  density: 'its density',
  resistivity: 'the resistivity it makes',
  dose: 'its dose',
} as const;

export const LENGTH_WORDS = { length: 'characteristic length', junction: 'depth of the junction' } as const;

export const METHOD_WORDS = { 'four-point': 'four-point probe', other: 'another method' } as const;

/** How a form asks for what is known of a dopant. */
export function givenField(
  given: keyof typeof GIVEN_WORDS,
  profile: Target['profile'],
): { label: string; unit: string; hint?: string } {
  if (given === 'resistivity') {
    return {
      label: 'Resistivity at 23 °C',
      unit: 'Ω·cm',
      hint: 'Numeric inverse of the standard conversion',
    };
  }
  if (given === 'dose') {
    return {
      label: 'Dose',
      unit: 'cm⁻²',
      hint: profile === 'implant' ? 'As the implanter counts it' : 'All of it',
    };
  }
  if (profile === 'uniform' || profile === 'box') {
    return { label: 'Dopant density', unit: 'cm⁻³', hint: 'Such as 1.34e15' };
  }
  if (profile === 'implant') {
    return { label: 'Peak density as implanted', unit: 'cm⁻³', hint: 'Before the drive-in' };
  }
  if (profile === 'pairs') {
    return {
      label: 'Peak density',
      unit: 'cm⁻³',
      hint: 'Empty: as the profile stands. Else it is scaled to it',
    };
  }
  return { label: 'Surface density', unit: 'cm⁻³', hint: 'Such as 1e19' };
}
