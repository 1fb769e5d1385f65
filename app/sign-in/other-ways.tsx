'use client';

import { useState } from 'react';
import { postToAccounts } from '@/app/accounts-request';
import { Button } from '@/app/_ui/button';
import { Notice } from '@/app/_ui/notice';
import styles from './sign-in.module.css';

/** Ways to sign in by one press: each button posts its body, and the browser goes where the answer says, or on. */
export function OtherWays(props: {
  ways: readonly { words: string; path: string; body: object }[];
  next: string;
}) {
  const [fault, setFault] = useState<string | null>(null);
  const [pressed, setPressed] = useState<string | null>(null);
  const go = async ({ words, path, body }: (typeof props.ways)[number]) => {
    if (pressed !== null) return;
    setPressed(words);
    const answer = await postToAccounts(path, body);
    if (answer.ok) {
      const { url } = answer.body as { url?: string };
      window.location.assign(url ?? props.next);
      return;
    }
    setPressed(null);
    setFault(answer.reason);
  };
  return (
    <>
      <div className={styles.ways}>
        {props.ways.map((way) => (
          <Button key={way.words} aria-disabled={pressed !== null} onClick={() => void go(way)}>
            {pressed === way.words ? 'Signing in…' : way.words}
          </Button>
        ))}
      </div>
      {fault !== null && <Notice kind="call">{fault}</Notice>}
    </>
  );
}
