import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { PageHead } from '@/app/_ui/page-head';
import { SectionHead } from '@/app/_ui/section-head';
import { hasOwnPassword, listOwnSessions } from '@/lib/access/own-sessions';
import { findActor } from '@/lib/access/request-actor';
import { grantWords } from '@/lib/access/role-words';
import { readEnvironment } from '@/lib/env';
import { listStreams } from '@/lib/streams/data';
import { PasswordForm } from './password-form';
import { SessionTable } from './session-table';
import { SignOut } from './sign-out';

export const metadata: Metadata = { title: 'Your account' };

/** Open to everyone who is signed in, with a role or without. */
export default async function AccountPage() {
  const actor = await findActor();
  if (actor === null || actor.kind !== 'person') redirect('/sign-in?next=/account');
  const [sessions, hasPassword, streams] = await Promise.all([
    listOwnSessions(actor),
    hasOwnPassword(actor),
    actor.grants.some((grant) => grant.streamIds !== null) ? listStreams(actor, { retired: true }) : [],
  ]);
  const nameOf = new Map(streams.map((stream) => [stream.id, stream.name]));
  const roles = actor.grants.map((grant) => grantWords(grant, nameOf));
  return (
    <>
      <PageHead
        answer={`You are signed in as ${actor.name}`}
        sub={
          roles.length === 0
            ? 'You have no role yet: an administrator gives it, under Setup, People.'
            : `Your roles: ${roles.join('; ')}. An administrator gives them.`
        }
      />
      <SignOut path="/sign-out" words="Sign out" />
      <SectionHead>Where you are signed in</SectionHead>
      <SessionTable sessions={sessions} timeZone={readEnvironment().siteTimeZone} />
      <SignOut path="/revoke-sessions" words="Sign out everywhere" />
      <SectionHead>Password</SectionHead>
      {hasPassword ? (
        <PasswordForm />
      ) : (
        <p className="quiet">This server keeps no password of yours: you sign in another way.</p>
      )}
    </>
  );
}
