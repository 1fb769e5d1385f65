import type { Person } from '@/lib/access/types';

/** How things stand with a person, in a word or two. */
export function personState({ demonstration, deactivatedAt, signsInBy }: Person): string {
  if (demonstration) return 'of the demonstration line';
  if (deactivatedAt !== null) return 'deactivated';
  return signsInBy.length === 0 ? 'has no password yet' : 'may sign in';
}
