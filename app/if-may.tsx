import type { ReactNode } from 'react';
import { may } from '@/lib/access/actor';
import { PERMISSIONS, type Permission } from '@/lib/access/permission';
import { findActor } from '@/lib/access/request-actor';
import { rolesThatMay } from '@/lib/access/role-words';

/**
 * What only those see who may use it; others read in its place for whom it is. This spares them a form that would be
 * refused, and decides nothing: the action behind the form asks for itself.
 */
export async function IfMay(props: { permission: Permission; streamId?: string; children: ReactNode }) {
  const { permission, streamId } = props;
  const actor = await findActor();
  if (actor !== null && may(actor, permission, streamId)) return props.children;
  const { words, ofChosen } = PERMISSIONS[permission];
  const where = ofChosen === 'those' && streamId !== undefined ? ' of this stream' : '';
  return (
    <p className="quiet">
      {words}: for {rolesThatMay(permission)}
      {where}.
    </p>
  );
}
