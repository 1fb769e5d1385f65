import { userInfo } from 'node:os';
import { provenActor, type Actor } from './actor';

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

/** Someone in a role on the demonstration line: nobody in particular. */
export function demonstrationActor(role: 'shift lead' | 'process owner'): Actor {
  return provenActor({ kind: 'program', id: null, name: `${role} (demonstration)`, grants: [] });
}
