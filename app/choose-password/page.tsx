import type { Metadata } from 'next';
import { PageHead } from '@/app/_ui/page-head';
import { ChoosePasswordForm } from './form';

export const metadata: Metadata = { title: 'Choose a password' };

/** Where an administrator's link leads. Its code stands behind the #, which browsers send to no server and no log. */
export default function ChoosePasswordPage() {
  return (
    <>
      <PageHead
        answer="Choose a password"
        sub="The link an administrator gave you works once. After that you sign in with your e-mail address and this password."
      />
      <ChoosePasswordForm />
    </>
  );
}
