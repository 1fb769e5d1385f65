import type { Metadata } from 'next';
import { SectionHead } from '@/app/_ui/section-head';
import { signedIn } from '@/app/page-actor';
import { listPeople } from '@/lib/access/data';
import { readEnvironment } from '@/lib/env';
import { listStreams } from '@/lib/streams/data';
import { AccessHead } from '../access-head';
import { AddForm } from './add-form';
import { peopleAnswer } from './people-answer';
import { PeopleTable } from './people-table';

export const metadata: Metadata = { title: 'People' };

export default async function PeoplePage() {
  const actor = await signedIn('manage-people');
  const [people, streams] = await Promise.all([listPeople(actor), listStreams(actor, { retired: true })]);
  const choices = streams.map(({ id, name }) => ({ id, name }));
  return (
    <>
      <AccessHead
        place="People"
        answer={peopleAnswer(people)}
        sub="A person has roles, each for all streams or for chosen ones. Nobody is ever deleted: what they did keeps their name."
      />
      <PeopleTable
        people={people}
        nameOf={new Map(choices.map(({ id, name }) => [id, name]))}
        timeZone={readEnvironment().siteTimeZone}
      />
      <SectionHead id="add">Add a person</SectionHead>
      <AddForm streams={choices} />
    </>
  );
}
