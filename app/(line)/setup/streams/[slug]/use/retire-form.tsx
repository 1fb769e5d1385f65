'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { retireStreamAction } from './actions';

/** Takes a stream out of use, or back. */
export function RetireForm({ slug, retired }: { slug: string; retired: boolean }) {
  return (
    <ActionForm
      action={retireStreamAction.bind(null, slug, !retired)}
      label={retired ? 'Take back into use' : 'Take out of use'}
      submit={retired ? 'Take it back into use' : 'Take it out of use'}
      weight="plain"
    >
      <p className="quiet">
        {retired
          ? 'It returns to the board, and files can name it again.'
          : 'It leaves the board, and files that name it are refused. Its wafers and charts stay, and it can come back.'}
      </p>
    </ActionForm>
  );
}
