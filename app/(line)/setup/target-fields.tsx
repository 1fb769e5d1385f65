'use client';

import { useEffect, useRef } from 'react';
import { CheckField } from '@/app/_ui/check-field';
import { SelectField } from '@/app/_ui/field';
import type { Target } from '@/lib/physics/target';
import { GIVEN_FIELD } from '@/lib/streams/target-of-fields';
import type { Stream } from '@/lib/streams/types';
import { FurtherFields } from './further-fields';
import { GIVEN_WORDS, givenField } from './given-field';
import { LayerFields } from './layer-fields';
import { Options } from './options';
import { targetChoices } from './target-choices';
import { TargetDopant, type TargetForm, TargetNumber } from './target-field';
import { PROFILE_WORDS } from './words';

/**
 * What a step aims at, asked as people of its kind know it: doping or resistivity, a dose with range and straggle, a
 * surface density and a depth. `words` is what stands in the form now; a field that appears is read at once.
 */
export function TargetFields(
  props: TargetForm & {
    words: Readonly<Record<string, string>>;
    kind: Stream['kind'];
    quantity: Target['quantity'];
  },
) {
  const { words, kind, quantity, initial, errors } = props;
  const form = { initial, errors };
  const choices = targetChoices(kind, words, initial['profile']);
  const { profile, givenNow, lengthNow } = choices;
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => {
    place.current?.dispatchEvent(new Event('input', { bubbles: true }));
  }, [kind, profile, givenNow, lengthNow, quantity]);
  const isUniform = profile === 'uniform';
  const isCrystal = kind === 'crystal' || initial['alongCrystal'] !== undefined;
  const value = givenField(givenNow, profile);
  return (
    <div ref={place}>
      <div className="columns">
        <TargetDopant {...form} name="dopant" label="Dopant" />
        {choices.profiles.length === 1 ? (
          <input type="hidden" name="profile" value={profile} />
        ) : (
          <SelectField
            key={`profile of ${kind}`}
            name="profile"
            label="Profile in depth"
            hint={quantity === 'resistivity' ? 'A graded layer has no single resistivity' : undefined}
            defaultValue={profile}
            error={errors['profile'] ?? null}
          >
            <Options words={PROFILE_WORDS} order={choices.profiles} />
          </SelectField>
        )}
        <SelectField
          key={`given of ${profile}`}
          name="given"
          label="Known of it"
          defaultValue={givenNow}
          error={errors['given'] ?? null}
        >
          <Options words={GIVEN_WORDS} order={choices.given} />
        </SelectField>
        <TargetNumber {...form} key={givenNow} name={GIVEN_FIELD[givenNow]} {...value} />
        <LayerFields {...form} kind={kind} quantity={quantity} choices={choices} />
        <TargetNumber
          {...form}
          name="tolerancePercent"
          label="Tolerance of the density"
          unit="± %"
          hint="What is accepted. Empty: none agreed"
        />
      </div>
      {isCrystal && (
        <CheckField
          name="alongCrystal"
          label="Along a crystal"
          hint="The density is that at the seed end; each wafer's own follows from its solidified fraction (Scheil)."
          defaultChecked={initial['dopant'] === undefined || initial['alongCrystal'] !== undefined}
        />
      )}
      <FurtherFields {...form} mayCounter={isUniform && quantity === 'resistivity'} />
    </div>
  );
}
