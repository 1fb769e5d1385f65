import type { Verb } from './verb';

/** Every verb, loaded when asked for: `map` needs neither database nor Next. */
export const verbLoaders: ReadonlyMap<string, () => Promise<Verb>> = new Map([
  ['serve', async () => (await import('./verbs/serve')).serve],
  ['build', async () => (await import('./verbs/build')).build],
  ['intake', async () => (await import('./verbs/intake')).intake],
  ['audit', async () => (await import('./verbs/audit')).audit],
  ['map', async () => (await import('./verbs/map')).map],
  ['expect', async () => (await import('./verbs/expect')).expect],
  ['study', async () => (await import('./verbs/study')).study],
  ['components', async () => (await import('./verbs/components')).components],
  ['capability', async () => (await import('./verbs/capability')).capability],
  ['runlength', async () => (await import('./verbs/runlength')).runlength],
]);
