import { DataTable } from '@/app/_ui/data-table';
import { PERMISSIONS, ROLE_WORDS, ROLES, type Permission } from '@/lib/access/permission';

const REACH_WORDS = {
  those: 'on those only',
  all: 'on all streams',
  none: 'not for chosen streams',
} as const;
const TOKEN_WORDS = { intake: 'for recording', read: 'for reading' } as const;

const NAMES = Object.keys(PERMISSIONS) as Permission[];

/** The table of permissions, as the program asks it. */
export function PermissionTable() {
  return (
    <DataTable
      caption="Who may do what"
      captionUnseen
      rows={NAMES}
      rowKey={(name) => name}
      columns={[
        { key: 'words', head: 'to', cell: (name) => PERMISSIONS[name].words },
        ...ROLES.map((role) => ({
          key: role,
          head: ROLE_WORDS[role],
          cell: (name: Permission) =>
            PERMISSIONS[name].roles.some((allowed) => allowed === role) ? (
              'may'
            ) : (
              <span className="quiet">—</span>
            ),
        })),
        {
          key: 'chosen',
          head: 'a role for chosen streams',
          cell: (name) => REACH_WORDS[PERMISSIONS[name].ofChosen],
        },
        {
          key: 'token',
          head: 'token',
          cell: (name) => {
            const { token } = PERMISSIONS[name];
            return token === null ? <span className="quiet">—</span> : TOKEN_WORDS[token];
          },
        },
      ]}
    />
  );
}
