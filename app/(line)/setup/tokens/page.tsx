import type { Metadata } from 'next';
import { SectionHead } from '@/app/_ui/section-head';
import { signedIn } from '@/app/page-actor';
import { listTokens } from '@/lib/access/data';
import { readEnvironment } from '@/lib/env';
import { listStreams } from '@/lib/streams/data';
import { AccessHead } from '../access-head';
import { TokenForm } from './forms';
import { tokenState } from './token-state';
import { TokenTable } from './token-table';

export const metadata: Metadata = { title: 'Tokens' };

export default async function TokensPage() {
  const actor = await signedIn('manage-tokens');
  const [tokens, streams] = await Promise.all([listTokens(actor), listStreams(actor, { retired: true })]);
  const now = new Date();
  const inForce = tokens.filter((token) => tokenState(token, now) === 'in force').length;
  const choices = streams.map(({ id, name }) => ({ id, name }));
  return (
    <>
      <AccessHead
        place="Tokens"
        answer={
          inForce === 0
            ? 'No token is in force'
            : inForce === 1
              ? '1 token is in force'
              : `${inForce} tokens are in force`
        }
        sub="A token lets a gauge or a program record wafer maps, or read, without a person. It is shown once, when it is made, and kept only as a digest."
      />
      <TokenTable
        tokens={tokens}
        nameOf={new Map(choices.map(({ id, name }) => [id, name]))}
        timeZone={readEnvironment().siteTimeZone}
        now={now}
      />
      <SectionHead id="make">Make a token</SectionHead>
      <TokenForm streams={choices} />
    </>
  );
}
