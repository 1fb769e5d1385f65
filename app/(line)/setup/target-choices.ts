import type { Target } from '@/lib/physics/target';
import type { Stream } from '@/lib/streams/types';

type Profile = Target['profile'];
type Given = 'density' | 'resistivity' | 'dose';
type LengthGiven = 'length' | 'junction';

/** The profiles that a kind of stream makes, the usual one first. */
const PROFILES_OF: Record<Stream['kind'], readonly Profile[]> = {
  substrate: ['uniform'],
  crystal: ['uniform'],
  epi: ['uniform'],
  implant: ['implant', 'pairs', 'gaussian', 'box'],
  diffusion: ['erfc', 'gaussian', 'pairs', 'box'],
};

/** What is commonly known of a profile's dopant, the usual first. */
const GIVEN_OF: Record<Profile, readonly Given[]> = {
  uniform: ['density', 'resistivity'],
  box: ['density', 'dose'],
  gaussian: ['density', 'dose'],
  erfc: ['density', 'dose'],
  implant: ['dose', 'density'],
  pairs: ['density', 'dose'],
};

/** What a target's form offers, and what is chosen now. */
export interface TargetChoices {
  profiles: readonly Profile[];
  profile: Profile;
  given: readonly Given[];
  givenNow: Given;
  lengths: readonly LengthGiven[];
  lengthNow: LengthGiven;
}

/**
 * The choices of a target's form: those of its kind, and the profile that the target in force has. Words that the kind
 * does not offer give way to the usual one.
 */
export function targetChoices(
  kind: Stream['kind'],
  words: Readonly<Record<string, string>>,
  profileInForce: string | undefined,
): TargetChoices {
  const own = PROFILES_OF[kind];
  const kept = (Object.keys(GIVEN_OF) as Profile[]).filter(
    (profile) => profile === profileInForce && !own.includes(profile),
  );
  const profiles = [...own, ...kept];
  const asked = words['profile'] ?? profileInForce;
  const profile = chosen(profiles, asked);
  // What was known of another kind's profile is not what is known of this one.
  const known = asked === undefined || asked === profile ? words : {};
  const given = GIVEN_OF[profile];
  const lengths: readonly LengthGiven[] =
    profile === 'gaussian' || profile === 'erfc' ? ['length', 'junction'] : ['length'];
  return {
    profiles,
    profile,
    given,
    givenNow: chosen(given, known['given']),
    lengths,
    lengthNow: chosen(lengths, known['lengthGiven']),
  };
}

function chosen<Word extends string>(offered: readonly Word[], word: string | undefined): Word {
  return offered.find((one) => one === word) ?? (offered[0] as Word);
}
