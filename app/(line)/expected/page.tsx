import type { Metadata } from 'next';
import { signedIn } from '@/app/page-actor';
import { Bench } from './bench';
import { benchWords } from './bench-question';

export const metadata: Metadata = { title: 'Expected' };

/** The bench of the physics: every question is an address. */
export default async function ExpectedPage(props: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  await signedIn('see-line');
  return <Bench first={benchWords(await props.searchParams)} />;
}
