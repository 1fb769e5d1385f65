import Link from 'next/link';
import { PageHead } from '@/app/_ui/page-head';

export default function NoSuchExcursion() {
  return (
    <>
      <PageHead
        back={{ href: '/excursions', label: 'Excursions' }}
        answer="There is no excursion of this number"
        sub="Excursions are numbered as they are opened and are never deleted, so the link is mistyped or comes from another site."
      />
      <p>
        <Link href="/excursions">See the excursions there are</Link>.
      </p>
    </>
  );
}
