import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { SectionHead } from '@/app/_ui/section-head';
import { signedIn } from '@/app/page-actor';
import { findPerson } from '@/lib/access/data';
import { grantWords } from '@/lib/access/role-words';
import { listStreams } from '@/lib/streams/data';
import { AccessHead } from '../../access-head';
import { personState } from '../person-state';
import { DeactivateForm, LinkForm, RolesForm, SessionsForm } from './forms';

export const metadata: Metadata = { title: 'Person' };

export default async function PersonPage(props: { params: Promise<{ id: string }> }) {
  const actor = await signedIn('manage-people');
  const [person, streams] = await Promise.all([
    findPerson(actor, decodeURIComponent((await props.params).id)),
    listStreams(actor, { retired: true }),
  ]);
  if (person === null) notFound();
  const { id, name, email, grants, sessions, demonstration } = person;
  const choices = streams.map((stream) => ({ id: stream.id, name: stream.name }));
  const nameOf = new Map(choices.map((choice) => [choice.id, choice.name]));
  const roles = grants.map((grant) => grantWords(grant, nameOf)).join('; ');
  const deactivated = person.deactivatedAt !== null;
  return (
    <>
      <AccessHead
        place="People"
        answer={`${name}: ${roles === '' ? 'no role yet' : roles}`}
        sub={`${email} · ${personState(person)} · ${sessions === 1 ? '1 session' : `${sessions} sessions`}`}
        back={{ href: '/setup/people', label: 'People' }}
      />
      {demonstration ? (
        <p className="quiet">
          The people of the demonstration line stay as they are. Without the demonstration they count for
          nothing.
        </p>
      ) : (
        <>
          <SectionHead id="roles">Roles</SectionHead>
          <RolesForm key={JSON.stringify(grants)} id={id} grants={grants} streams={choices} />
          {!deactivated && (
            <>
              <SectionHead id="link">Password</SectionHead>
              <LinkForm id={id} />
              <SectionHead id="sessions">Sessions</SectionHead>
              <SessionsForm id={id} />
            </>
          )}
          <SectionHead id="deactivate">{deactivated ? 'Deactivated' : 'Deactivate'}</SectionHead>
          <DeactivateForm id={id} deactivated={deactivated} />
        </>
      )}
    </>
  );
}
