import Link from 'next/link';
import type { ReactNode } from 'react';
import { PageHead } from '@/app/_ui/page-head';
import { Tabs } from '@/app/_ui/tabs';
import type { Stream } from '@/lib/streams/types';

const PLACES = [
  { path: '', name: 'Target' },
  { path: '/specification', name: 'Specification' },
  { path: '/limits', name: 'Limits' },
  { path: '/events', name: 'Events' },
  { path: '/use', name: 'Use' },
] as const;

export type StreamPlace = (typeof PLACES)[number]['name'];

/** The head of each page of a stream's setup: its answer, what the stream is, and the way between the pages. */
export function StreamHead(props: { stream: Stream; place: StreamPlace; answer: ReactNode }) {
  const { stream } = props;
  const root = `/setup/streams/${stream.slug}`;
  return (
    <>
      <PageHead
        answer={props.answer}
        sub={
          <>
            {stream.step} · {stream.tool}
            {stream.chamber !== '' && ` ${stream.chamber}`} · recipe {stream.recipe} · {stream.plan.name} ·{' '}
            <Link href={`/streams/${stream.slug}`}>charts</Link>
          </>
        }
        back={{ href: '/setup', label: 'Setup' }}
      />
      <Tabs
        label={`Setup of ${stream.name}`}
        tabs={PLACES.map(({ path, name }) => ({
          href: `${root}${path}`,
          name,
          current: name === props.place,
        }))}
      />
    </>
  );
}
