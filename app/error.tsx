'use client';

import Link from 'next/link';
import { Button } from './_ui/button';
import { Notice } from './_ui/notice';
import { PageHead } from './_ui/page-head';

export default function PageError({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <>
      <PageHead
        answer="This page could not be made"
        sub="What is recorded is untouched. Trying again often helps; if it does not, the server's log says why."
      />
      {error.digest !== undefined && <Notice kind="note">The log names this failure {error.digest}.</Notice>}
      <p>
        <Button onClick={reset}>Try again</Button> or <Link href="/">go to the board</Link>.
      </p>
    </>
  );
}
