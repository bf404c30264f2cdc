import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { Wordmark } from '@/components/register/wordmark';
import { routes } from '@/lib/routes';
import { currentActor } from '@/lib/server/actor';
import { SignInForm } from './sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

type Props = { searchParams: Promise<{ next?: string | string[] }> };

export default async function SignInPage({ searchParams }: Props) {
  if (await currentActor()) redirect(routes.today());
  const { next } = await searchParams;
  return (
    <main className="mx-auto flex max-w-sm flex-col gap-6 px-4 py-16">
      <div>
        <Wordmark />
        <p className="mt-2 text-ink-soft">
          The condition and balance register: how each machine stands, what hangs on its rotor, and
          what was learned the last time.
        </p>
      </div>
      <h1 className="text-lg font-semibold">Sign in</h1>
      <SignInForm next={typeof next === 'string' ? next : ''} />
    </main>
  );
}
