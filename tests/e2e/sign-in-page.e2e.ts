import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { routes } from '@/lib/routes';
import { baseUrl, openChromium } from '@/tests/support/chromium';

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

it('shows the sign-in page to whoever is not signed in, without an error in the console', async () => {
  const page = await browser.newPage();
  const errors: string[] = [];
  page.on('pageerror', (error) => errors.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(message.text());
  });
  await page.goto(baseUrl() + routes.signIn());
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  expect(await page.title()).toBe('Sign in · Evenrun');
  expect(errors).toEqual([]);
});
