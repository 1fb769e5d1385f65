import Link from 'next/link';
import { PageHead } from '@/app/_ui/page-head';

export default function NoSuchFile() {
  return (
    <>
      <PageHead
        answer="No file waits at this address"
        sub="It has been recorded or discarded, or it waited for more than a day. What was recorded stands among the batches."
      />
      <p>
        <Link href="/intake">Go to the intake</Link>
      </p>
    </>
  );
}
