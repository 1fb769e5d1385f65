'use client';

import { useState } from 'react';
import { postToAccounts } from '@/app/accounts-request';
import { Button } from '@/app/_ui/button';
import { Notice } from '@/app/_ui/notice';

/** Ends the session that presses it, or all of the person's, and leaves the site's pages behind. */
export function SignOut({ path, words }: { path: '/sign-out' | '/revoke-sessions'; words: string }) {
  const [fault, setFault] = useState<string | null>(null);
  const leave = async () => {
    const answer = await postToAccounts(path, {});
    if (answer.ok) window.location.assign('/sign-in');
    else setFault(answer.reason);
  };
  return (
    <div style={{ marginBlock: 12 }}>
      <Button onClick={() => void leave()}>{words}</Button>
      {fault !== null && <Notice kind="call">{fault}</Notice>}
    </div>
  );
}
