import { AxeBuilder } from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { expect } from 'vitest';

/** The widths that every place is looked at: a desk and a phone. */
export const WIDTHS = { desk: 1440, phone: 390 } as const;

/** A page in a session of its own; `errors` gathers what its console and its scripts complain of. */
export async function openPage(
  browser: Browser,
  width: number = WIDTHS.desk,
): Promise<{ page: Page; errors: string[]; close: () => Promise<void> }> {
  const context = await browser.newContext({ viewport: { width, height: 900 }, locale: 'en-GB' });
  const page = await context.newPage();
  page.setDefaultTimeout(30_000);
  const errors: string[] = [];
  page.on('pageerror', (error) => errors.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(`${message.text()} ${message.location().url}`);
  });
  return { page, errors, close: () => context.close() };
}

/** Fails with what axe-core finds against WCAG 2.1 A and AA, one line a finding. */
export async function expectAccessible(page: Page): Promise<void> {
  // The title of a page that was navigated to comes with the stream, after the page itself.
  await page.waitForFunction(() => document.title !== '');
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa'])
    .analyze();
  const found = violations.flatMap(({ id, nodes }) =>
    nodes.map(({ html, failureSummary }) => `${id}: ${html.slice(0, 160)} ${failureSummary ?? ''}`),
  );
  expect(found, page.url()).toEqual([]);
}

/** Fails where the page is wider than its window. */
export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const over = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(over, `${page.url()} is wider than its window, px`).toBeLessThanOrEqual(0);
}

/** What the page says, with plain spaces. */
export async function textOf(page: Page): Promise<string> {
  return (await page.getByRole('main').innerText()).replaceAll('\u00a0', ' ');
}
