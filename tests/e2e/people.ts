import type { Page } from 'playwright-core';
import signIns from '@/seeders/demo-sign-ins.json';
import type { Role } from '@/lib/domain/access/permissions';
import { baseUrl } from '@/tests/support/chromium';
import { signIn } from './balance-journey';

/** Signs in as the demo plant's person of a role. */
export async function signInAs(page: Page, role: Role): Promise<void> {
  const person = signIns.find((one) => one.role === role);
  if (!person) throw new Error(`the demo plant has no ${role}`);
  await signIn(page, baseUrl(), person.email, person.password);
}
