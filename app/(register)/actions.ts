'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { chooseSite } from '@/lib/server/chosen-site';
import { sessionCookie } from '@/lib/server/session';
import { endSession } from '@/lib/server/sign-in';

export async function signOutAction(): Promise<void> {
  const cookie = await sessionCookie();
  if (cookie.key) await endSession(cookie.key);
  cookie.destroy();
  redirect(routes.signIn());
}

export async function switchSiteAction(form: FormData): Promise<void> {
  await chooseSite(await requireActor(), Number(form.get('siteId')));
  revalidatePath('/', 'layout');
}
