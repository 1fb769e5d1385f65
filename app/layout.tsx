import type { Metadata, Viewport } from 'next';
import Link from 'next/link';
import type { ReactNode } from 'react';
import '@fontsource-variable/atkinson-hyperlegible-next/wght.css';
import './globals.css';
import { findActor } from '@/lib/access/request-actor';
import { Hatches } from './_charts/hatches';
import { Finder } from './_ui/finder';
import { Keys } from './_ui/keys';
import { SiteFooter } from './_ui/site-footer';
import { SiteHeader } from './_ui/site-header';

/** Every page is made for its request: it shows what is recorded now, and each script carries a fresh nonce. */
export const dynamic = 'force-dynamic';

export const metadata: Metadata = {
  title: { default: 'Evenohm', template: '%s · Evenohm' },
  description:
    'Resistivity maps of monitor wafers, judged: control, evenness, and the value physics expects.',
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#fbfaf6' },
    { media: '(prefers-color-scheme: dark)', color: '#15181b' },
  ],
};

const places = [
  { href: '/', label: 'Board', covers: ['/streams', '/wafers'] },
  { href: '/excursions', label: 'Excursions' },
  { href: '/intake', label: 'Intake' },
  { href: '/expected', label: 'Expected' },
  { href: '/setup', label: 'Setup' },
];

const keys = [
  { key: '← →', does: 'move along wafers, or along the points of a chart' },
  { key: 'Home End', does: 'first and last point of a chart' },
  { key: '+ −', does: 'look closer or wider on a chart' },
  { key: 'Enter', does: 'open what is under the cursor' },
  { key: 'Escape', does: 'go back to the page above' },
  { key: '/', does: 'find a stream' },
  { key: '?', does: 'show these keys' },
];

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Without the database the page says what is wrong: the frame around it must not fail too.
  const actor = await findActor().catch(() => null);
  return (
    <html lang="en">
      <body>
        <a className="unseen" href="#content">
          Skip to the content
        </a>
        <Hatches />
        <SiteHeader name="evenohm" home="/" places={actor === null ? [] : places}>
          {actor === null ? (
            <Link href="/sign-in">Sign in</Link>
          ) : (
            <>
              <Finder action="/" name="find" label="Find a stream" />
              <Link href="/account" className="who">
                <span className="unseen">Your account: </span>
                {actor.name}
              </Link>
            </>
          )}
        </SiteHeader>
        <main id="content" tabIndex={-1}>
          {children}
        </main>
        <SiteFooter>
          Figures are at 23 °C unless a page says otherwise. Before acting on equipment, follow site
          procedures and change control, with qualified staff.{' '}
          <Link href="/methods">Methods and sources</Link>
        </SiteFooter>
        <Keys keys={keys} />
      </body>
    </html>
  );
}
