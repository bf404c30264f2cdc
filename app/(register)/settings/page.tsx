import type { Metadata } from 'next';
import Link from 'next/link';
import { PageHead } from '@/components/ui/page-head';
import { allows, type Permission } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';

export const metadata: Metadata = { title: 'Settings' };

const SECTIONS: readonly { label: string; href: string; says: string; needs: Permission }[] = [
  {
    label: 'People',
    href: routes.people(),
    says: 'Who signs in, in which role, to which sites.',
    needs: 'person:read',
  },
  {
    label: 'Limit sets',
    href: routes.limitSets(),
    says: 'Zone boundaries A/B, B/C and C/D, with where they come from.',
    needs: 'limitSet:read',
  },
  {
    label: 'Your password',
    href: routes.ownPassword(),
    says: 'Change it; every session of yours ends and you sign in again.',
    needs: 'password:change',
  },
  {
    label: 'Style sheet',
    href: routes.styleSheet(),
    says: 'Every part of the screen in every state, with invented data.',
    needs: 'register:read',
  },
];

export default async function SettingsPage() {
  const actor = await requireActor();
  return (
    <>
      <PageHead title="Settings" />
      <ul className="flex max-w-3xl flex-col divide-y divide-rule rounded border border-rule bg-sheet">
        {SECTIONS.filter(({ needs }) => allows(actor.role, needs)).map(({ label, href, says }) => (
          <li key={href} className="px-4 py-3 sm:px-5">
            <Link className="link text-base font-semibold" href={href}>
              {label}
            </Link>
            <p className="text-ink-soft">{says}</p>
          </li>
        ))}
      </ul>
    </>
  );
}
