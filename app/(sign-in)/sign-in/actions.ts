'use server';

import { redirect } from 'next/navigation';
import { routes } from '@/lib/routes';
import type { ActionState } from '@/lib/schemas/action-state';
import { signInInput } from '@/lib/schemas/sign-in';
import { typedValues } from '@/lib/server/form-input';
import { sessionCookie } from '@/lib/server/session';
import { signIn } from '@/lib/server/sign-in';

export async function signInAction(_previous: ActionState, form: FormData): Promise<ActionState> {
  const values = typedValues(form);
  const parsed = signInInput.safeParse(Object.fromEntries(form));
  if (!parsed.success) {
    const failures = parsed.error.issues.map(({ path, message }) => ({
      code: 'input',
      message,
      field: path.join('.'),
    }));
    const [failure] = failures;
    if (failure) return { status: 'failed', failure, failures, values };
    return { status: 'idle' };
  }
  const result = await signIn(parsed.data.email, parsed.data.password);
  if (!result.ok)
    return { status: 'failed', failure: result.failure, failures: [result.failure], values };
  const cookie = await sessionCookie();
  cookie.key = result.value.key;
  await cookie.save();
  redirect(safeNext(form.get('next')));
}

/** Only an address of this product, so that a link cannot lead elsewhere after signing in. */
function safeNext(next: FormDataEntryValue | null): string {
  const path = typeof next === 'string' ? next : '';
  return /^\/(?![/\\])/.test(path) ? path : routes.today();
}
