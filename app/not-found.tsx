import type { Metadata } from 'next';
import Link from 'next/link';
import { PageHead } from './_ui/page-head';

export const metadata: Metadata = { title: 'Nothing at this address' };

export default function NotFound() {
  return (
    <>
      <PageHead
        answer="Nothing is kept at this address"
        sub="The link may be mistyped, or what it pointed to was never recorded here."
      />
      <p>
        <Link href="/">Go to the board</Link>, or find a stream with the key /.
      </p>
    </>
  );
}
