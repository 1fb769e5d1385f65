import Link from 'next/link';
import { PageHead } from '@/app/_ui/page-head';

export default function NoSuchStream() {
  return (
    <>
      <PageHead
        answer="There is no stream by this name"
        sub="It may be mistyped, or was never set up here."
      />
      <p>
        <Link href="/setup">Go to the setup</Link>
      </p>
    </>
  );
}
