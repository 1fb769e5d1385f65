import type { Person } from '@/lib/access/types';

/**
 * Who may sign in, in one sentence.
 *
 * @example peopleAnswer([ines]) // '1 person may sign in, 1 of them an administrator'
 */
export function peopleAnswer(people: readonly Person[]): string {
  const own = people.filter(({ demonstration, deactivatedAt }) => !demonstration && deactivatedAt === null);
  if (own.length === 0) return 'Nobody has an account yet but the people of the demonstration line';
  const administrators = own.filter(({ grants }) =>
    grants.some(({ role }) => role === 'administrator'),
  ).length;
  const who = own.length === 1 ? '1 person' : `${own.length} people`;
  const what =
    administrators === 1 ? '1 of them an administrator' : `${administrators} of them administrators`;
  return `${who} may sign in, ${what}`;
}
