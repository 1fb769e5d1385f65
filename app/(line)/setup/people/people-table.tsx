import Link from 'next/link';
import { DataTable } from '@/app/_ui/data-table';
import { grantWords } from '@/lib/access/role-words';
import type { Person } from '@/lib/access/types';
import { formatDateTime } from '@/lib/format';
import { personState } from './person-state';

/** Everybody who may sign in, or once might, with their roles. */
export function PeopleTable(props: {
  people: readonly Person[];
  nameOf: ReadonlyMap<string, string>;
  timeZone: string;
}) {
  return (
    <DataTable
      caption="People"
      captionUnseen
      rows={props.people}
      rowKey={({ id }) => id}
      columns={[
        {
          key: 'name',
          head: 'name',
          cell: ({ id, name }) => <Link href={`/setup/people/${encodeURIComponent(id)}`}>{name}</Link>,
        },
        { key: 'email', head: 'e-mail address', cell: ({ email }) => email },
        {
          key: 'roles',
          head: 'roles',
          cell: ({ grants }) => grants.map((grant) => grantWords(grant, props.nameOf)).join('; ') || 'none',
        },
        { key: 'state', head: 'state', cell: personState },
        {
          key: 'signed-in',
          head: 'signed in',
          cell: ({ sessions, lastSignInAt }) =>
            sessions === 0 ? 'no' : `since ${formatDateTime(lastSignInAt, props.timeZone)}`,
        },
      ]}
    />
  );
}
