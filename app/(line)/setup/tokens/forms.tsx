'use client';

import { useState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { Field, SelectField } from '@/app/_ui/field';
import { TOKEN_DAYS } from '@/lib/access/schema';
import { StreamBoxes, type StreamChoice } from '../stream-boxes';
import { makeTokenAction, revokeTokenAction } from './actions';

/** Asks for a token; the answer shows it once. */
export function TokenForm({ streams }: { streams: readonly StreamChoice[] }) {
  const [scope, setScope] = useState('intake');
  const [reach, setReach] = useState('all');
  return (
    <ActionForm action={makeTokenAction} submit="Make the token" label="Make a token">
      {({ errors }) => (
        <>
          <div className="columns">
            <Field
              name="name"
              label="Name"
              hint="The gauge or program that will show it"
              autoComplete="off"
              maxLength={80}
              error={errors['name'] ?? null}
            />
            <SelectField
              name="scope"
              label="For"
              value={scope}
              onChange={(event) => setScope(event.target.value)}
              error={errors['scope'] ?? null}
            >
              <option value="intake">recording wafer maps</option>
              <option value="read">reading</option>
            </SelectField>
            {scope === 'intake' && (
              <SelectField
                name="reach"
                label="Of"
                value={reach}
                onChange={(event) => setReach(event.target.value)}
                error={errors['reach'] ?? null}
              >
                <option value="all">all streams</option>
                <option value="chosen">chosen streams</option>
              </SelectField>
            )}
            <SelectField name="days" label="Holds" error={errors['days'] ?? null}>
              {TOKEN_DAYS.map((days) => (
                <option key={days} value={days}>
                  {days} days
                </option>
              ))}
            </SelectField>
          </div>
          {scope === 'intake' && reach === 'chosen' && (
            <StreamBoxes name="streams-token" legend="Streams of the token" streams={streams} chosen={[]} />
          )}
        </>
      )}
    </ActionForm>
  );
}

/** Revokes one token. */
export function RevokeForm({ id, name }: { id: string; name: string }) {
  return (
    <ActionForm
      action={revokeTokenAction.bind(null, id)}
      submit="Revoke"
      label={`Revoke ${name}`}
      weight="plain"
    />
  );
}
