import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { Notice } from '@/app/_ui/notice';
import { PageHead } from '@/app/_ui/page-head';
import { SectionHead } from '@/app/_ui/section-head';
import { PLANT_PROVIDER } from '@/lib/access/auth-paths';
import { isDemonstrationOffered } from '@/lib/access/demonstration';
import { isFirstAdministratorDue } from '@/lib/access/first-administrator';
import { ROLES, ROLE_WORDS } from '@/lib/access/permission';
import { findActor } from '@/lib/access/request-actor';
import { siteAddress } from '@/lib/access/requested-address';
import { readEnvironment } from '@/lib/env';
import { OtherWays } from './other-ways';
import { providerFault } from './provider-fault';
import { SignInForm } from './sign-in-form';
import styles from './sign-in.module.css';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage(props: {
  searchParams: Promise<{ next?: string | string[]; error?: string | string[] }>;
}) {
  const asked = await props.searchParams;
  const next = siteAddress([asked.next].flat()[0]);
  if ((await findActor()) !== null) redirect(next);
  const { oidc } = readEnvironment();
  const fault = providerFault([asked.error].flat()[0]);
  const errorCallbackURL = `/sign-in?next=${encodeURIComponent(next)}`;
  return (
    <>
      <PageHead
        answer="Sign in to see the line"
        sub="What is done here is kept with the name of whoever did it. An administrator gives accounts and roles."
      />
      <div className={styles.narrow}>
        {fault !== null && <Notice kind="call">{fault}</Notice>}
        <SignInForm next={next} />
        {oidc !== null && (
          <>
            <SectionHead>Without a password of this server</SectionHead>
            <OtherWays
              next={next}
              ways={[
                {
                  words: `Sign in with ${oidc.name}`,
                  path: '/sign-in/social',
                  body: { provider: PLANT_PROVIDER, callbackURL: next, errorCallbackURL },
                },
              ]}
            />
          </>
        )}
      </div>
      {isDemonstrationOffered() && (
        <>
          <SectionHead>Look round the demonstration line</SectionHead>
          <p className="quiet">
            Offered while the demonstration is on and the server answers to this machine alone. Each button
            signs in as an invented person with that role.
          </p>
          <OtherWays
            next={next}
            ways={ROLES.map((role) => ({
              words: `As ${ROLE_WORDS[role]}`,
              path: '/sign-in/demonstration',
              body: { role },
            }))}
          />
        </>
      )}
      {(await isFirstAdministratorDue()) && (
        <p>
          Nobody else has an account yet:{' '}
          <Link href="/first-administrator">enter the first administrator</Link>.
        </p>
      )}
    </>
  );
}
