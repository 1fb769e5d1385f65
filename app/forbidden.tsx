import { setImmediate } from 'node:timers/promises';
import type { Metadata } from 'next';
import Link from 'next/link';
import { findActor } from '@/lib/access/request-actor';
import { rolesThatMay } from '@/lib/access/role-words';
import { PageHead } from './_ui/page-head';
import { refusedPermission } from './refused-permission';

export const metadata: Metadata = { title: 'Not for your roles' };

/** Stands in for a page that its reader may not see, and says which roles may. */
export default async function Forbidden() {
  const actor = await findActor();
  // Made beside the page, not after it: by then the page has found out what is refused.
  await setImmediate();
  const { permission } = refusedPermission();
  const isWithoutRole = actor !== null && actor.grants.length === 0;
  return (
    <>
      <PageHead
        answer={isWithoutRole ? 'You have no role here yet' : 'Your roles do not reach this page'}
        sub={
          isWithoutRole
            ? 'An administrator gives roles, under Setup, People. After that this page opens.'
            : permission === null
              ? 'An administrator gives roles, under Setup, People.'
              : `It is for ${rolesThatMay(permission)}. An administrator gives roles, under Setup, People.`
        }
      />
      <p>
        <Link href="/account">Your account</Link> says which roles you have
        {isWithoutRole ? (
          '.'
        ) : (
          <>
            , and <Link href="/">the board</Link> is open to all.
          </>
        )}
      </p>
    </>
  );
}
