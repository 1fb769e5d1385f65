import { userInfo } from 'node:os';
import { provenActor, type Actor } from './actor';
import { demonstrationId, demonstrationName } from './demonstration';
import type { Role } from './permission';

/** Whoever runs the command line on this machine: the operating system's user. */
export function commandActor(): Actor {
  return provenActor({
    kind: 'command',
    id: null,
    name: `${userInfo().username} (command line)`,
    grants: [],
  });
}

/** The program itself, for what it does without being asked: a first baseline, the demonstration line. */
export function programActor(): Actor {
  return provenActor({ kind: 'program', id: null, name: 'Evenohm', grants: [] });
}

/** Who shows a role on the demonstration line, so that what was done there long ago was done by whoever looks round. */
export function demonstrationActor(role: Role): Actor {
  return provenActor({
    kind: 'person',
    id: demonstrationId(role),
    name: demonstrationName(role),
    grants: [{ role, streamIds: null }],
  });
}
