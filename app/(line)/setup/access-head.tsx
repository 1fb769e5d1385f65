import type { ReactNode } from 'react';
import { PageHead } from '@/app/_ui/page-head';
import { Tabs } from '@/app/_ui/tabs';

const PLACES = [
  { href: '/setup/people', name: 'People' },
  { href: '/setup/tokens', name: 'Tokens' },
  { href: '/setup/permissions', name: 'Permissions' },
] as const;

/** The head of each page about who may do what, and the way between them. */
export function AccessHead(props: {
  place: (typeof PLACES)[number]['name'];
  answer: ReactNode;
  sub?: ReactNode;
  back?: { href: string; label: string };
}) {
  return (
    <>
      <PageHead
        answer={props.answer}
        sub={props.sub}
        back={props.back ?? { href: '/setup', label: 'Setup' }}
      />
      <Tabs
        label="People and access"
        tabs={PLACES.map(({ href, name }) => ({ href, name, current: name === props.place }))}
      />
    </>
  );
}
