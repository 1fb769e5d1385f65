import { DataTable } from '@/app/_ui/data-table';
import type { TokenOnRecord } from '@/lib/access/types';
import { formatDateTime } from '@/lib/format';
import { RevokeForm } from './forms';
import { tokenState } from './token-state';

/** Every token that was made, with what it opens and when it was last shown. */
export function TokenTable(props: {
  tokens: readonly TokenOnRecord[];
  nameOf: ReadonlyMap<string, string>;
  timeZone: string;
  now: Date;
}) {
  const at = (moment: Date | null) => formatDateTime(moment, props.timeZone);
  const streams = (ids: readonly string[] | null) =>
    ids === null ? 'all streams' : ids.map((id) => props.nameOf.get(id) ?? `stream ${id}`).join(', ');
  return (
    <DataTable
      caption="Tokens"
      captionUnseen
      rows={props.tokens}
      rowKey={({ id }) => id}
      empty="No token has been made yet."
      columns={[
        { key: 'name', head: 'name', cell: ({ name }) => name },
        { key: 'begins', head: 'begins', cell: ({ prefix }) => <code>{prefix}…</code> },
        {
          key: 'for',
          head: 'for',
          cell: ({ scope, streamIds }) =>
            scope === 'read' ? 'reading' : `recording maps of ${streams(streamIds)}`,
        },
        { key: 'made', head: 'made', cell: (one) => `${at(one.createdAt)} by ${one.createdBy}` },
        { key: 'expires', head: 'expires', cell: ({ expiresAt }) => at(expiresAt) },
        { key: 'used', head: 'last used', cell: ({ lastUsedAt }) => at(lastUsedAt) },
        {
          key: 'state',
          head: 'state',
          cell: (one) => {
            const state = tokenState(one, props.now);
            if (state === 'revoked') return `revoked ${at(one.revokedAt)} by ${one.revokedBy}`;
            return state === 'expired' ? state : <RevokeForm id={one.id} name={one.name} />;
          },
        },
      ]}
    />
  );
}
