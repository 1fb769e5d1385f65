import Link from 'next/link';
import { SectionHead } from '@/app/_ui/section-head';
import { may, type Actor } from '@/lib/access/actor';
import type { Permission } from '@/lib/access/permission';

const LINKS: readonly { href: string; words: string; says: string; permission: Permission }[] = [
  { href: '/setup/people', words: 'People', says: 'who may sign in, as what', permission: 'manage-people' },
  {
    href: '/setup/tokens',
    words: 'Tokens',
    says: 'what gauges and programs show instead',
    permission: 'manage-tokens',
  },
  {
    href: '/setup/permissions',
    words: 'Permissions',
    says: 'what each role may do; four eyes',
    permission: 'change-settings',
  },
  {
    href: '/audit',
    words: 'Audit trail',
    says: 'who did what, when and why',
    permission: 'read-audit',
  },
];

/** The ways to what an administrator keeps, or a manager reads; nothing for anyone else. */
export function AccessLinks({ actor }: { actor: Actor }) {
  const links = LINKS.filter(({ permission }) => may(actor, permission));
  if (links.length === 0) return null;
  return (
    <>
      <SectionHead id="access">People and access</SectionHead>
      <ul>
        {links.map(({ href, words, says }) => (
          <li key={href}>
            <Link href={href}>{words}</Link>: {says}
          </li>
        ))}
      </ul>
    </>
  );
}
