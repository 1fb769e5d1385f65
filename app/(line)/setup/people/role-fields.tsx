'use client';

import { useState } from 'react';
import { SelectField } from '@/app/_ui/field';
import type { Grant } from '@/lib/access/actor';
import { ROLE_WORDS, ROLES, type Role } from '@/lib/access/permission';
import { STREAM_ROLES } from '@/lib/access/schema';
import { StreamBoxes, type StreamChoice } from '../stream-boxes';

/** How far each role of a person goes: not at all, all streams, or chosen ones. */
export function RoleFields(props: {
  grants: readonly Grant[];
  streams: readonly StreamChoice[];
  errors: Readonly<Record<string, string>>;
}) {
  return (
    <div className="columns">
      {ROLES.map((role) => (
        <RoleField key={role} role={role} {...props} />
      ))}
    </div>
  );
}

function RoleField({ role, grants, streams, errors }: { role: Role } & Parameters<typeof RoleFields>[0]) {
  const grant = grants.find((one) => one.role === role);
  const before = grant === undefined ? 'no' : grant.streamIds === null ? 'all' : 'chosen';
  const [reach, setReach] = useState<string>(before);
  const canBeChosen = STREAM_ROLES.includes(role) && streams.length > 0;
  const word = ROLE_WORDS[role];
  return (
    <div>
      <SelectField
        name={`role-${role}`}
        label={word.charAt(0).toUpperCase() + word.slice(1)}
        value={reach}
        onChange={(event) => setReach(event.target.value)}
        error={errors[`role-${role}`] ?? null}
      >
        <option value="no">no</option>
        <option value="all">{canBeChosen ? 'yes, for all streams' : 'yes'}</option>
        {canBeChosen && <option value="chosen">yes, for chosen streams</option>}
      </SelectField>
      {reach === 'chosen' && (
        <StreamBoxes
          name={`streams-${role}`}
          legend={`Streams as ${word}`}
          streams={streams}
          chosen={grant?.streamIds ?? []}
        />
      )}
    </div>
  );
}
