import type { Metadata } from 'next';
import { PageHead } from '@/components/ui/page-head';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { PasswordForm } from './password-form';

export const metadata: Metadata = { title: 'Your password' };

export default async function OwnPasswordPage() {
  const { name, email } = await requireActor();
  return (
    <>
      <PageHead
        title="Your password"
        crumbs={[{ label: 'Settings', href: routes.settings() }, { label: 'Your password' }]}
        note={`${name}, ${email}`}
      />
      <PasswordForm />
    </>
  );
}
