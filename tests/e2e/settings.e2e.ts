import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { routes } from '@/lib/routes';
import {
  expectAccessible,
  expectNoSidewaysScroll,
  openPage,
  textOf,
  WIDTHS,
} from '@/tests/support/browser-page';
import { baseUrl, openChromium } from '@/tests/support/chromium';
import { signIn } from './balance-journey';
import { signInAs } from './people';

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

const PASSWORD = 'three plain words';
const unique = Date.now().toString(36);

async function enterPerson(page: Page, name: string, email: string): Promise<void> {
  const submit = page.getByRole('button', { name: 'Enter person' });
  await page.goto(baseUrl() + routes.people());
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel(/^Technician/).check();
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('First password').fill(PASSWORD);
  await submit.click();
  const problem = page.getByRole('button', { name: 'Choose at least one site.' });
  await problem.waitFor();
  await expectAccessible(page);
  expect(await page.getByLabel('Name', { exact: true }).inputValue()).toBe(name);
  expect(await page.getByLabel(/^Technician/).isChecked()).toBe(true);
  expect(await page.getByLabel('E-mail').inputValue()).toBe(email);
  expect(await page.content()).not.toContain(PASSWORD);
  await problem.press('Enter');
  await page.keyboard.press('Space');
  expect(await page.getByLabel('Northbank Works').isChecked()).toBe(true);
  await page.getByLabel('First password').fill(PASSWORD);
  await submit.click();
  await page.getByText('Hand the password over in person.').waitFor();
}

describe('people', () => {
  it('are entered with nothing lost, sign in, and are out at once when closed', async () => {
    const [name, email] = [`Ida ${unique}`, `ida.${unique}@northbank.example`];
    const { page, errors, close } = await openPage(browser, WIDTHS.phone);
    await signInAs(page, 'administrator');
    await enterPerson(page, name, email);
    const theirs = await openPage(browser);
    await signIn(theirs.page, baseUrl(), email, PASSWORD);
    await page.getByRole('link', { name, exact: true }).click();
    await page.getByRole('heading', { level: 1, name }).waitFor();
    await expectAccessible(page);
    await expectNoSidewaysScroll(page);
    await page.getByLabel('Why?').fill('Left the plant');
    await page.getByRole('button', { name: 'Close account' }).click();
    await page.getByRole('heading', { level: 1, name: 'People' }).waitFor();
    const row = page.getByRole('row').filter({ hasText: name });
    await row.getByText('closed').waitFor();
    await theirs.page.goto(baseUrl() + routes.plantBook());
    expect(new URL(theirs.page.url()).pathname).toBe(routes.signIn());
    expect(errors).toEqual([]);
    await theirs.close();
    await close();
  });
});

async function typeLimits(page: Page, title: string): Promise<void> {
  await page
    .getByRole('main')
    .getByLabel('Site', { exact: true })
    .selectOption({ label: 'Northbank Works' });
  await page.getByLabel('Title').fill(title);
  await page.getByLabel('Edition or date').fill('2026');
  await page.getByLabel('Where the values come from').fill('Contract of the mill fans');
  await page.getByLabel('Boundary A/B').fill('2,3');
  await page.getByLabel('Boundary B/C').fill('4,5');
  await page.getByLabel('Boundary C/D').fill('4,1');
  await page.getByLabel('flexible', { exact: true }).check();
}

/** How many choices of the form for a new machine name this limit set. */
async function offered(page: Page, title: string): Promise<number> {
  await page.goto(baseUrl() + routes.newMachine());
  await page
    .getByRole('option', { name: /ISO 20816-3/ })
    .first()
    .waitFor({ state: 'attached' });
  return page.getByRole('option').filter({ hasText: title }).count();
}

describe('limit sets', () => {
  it('of a site are entered after a slip, offered to a machine, and retired', async () => {
    const title = `Mill fans ${unique}`;
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'engineer');
    await page.goto(baseUrl() + routes.limitSets());
    await typeLimits(page, title);
    await page.getByRole('button', { name: 'Enter limit set' }).click();
    await page.getByRole('button', { name: /B\/C is 4.5 and C\/D 4.1/ }).waitFor();
    expect(await page.getByLabel('Title').inputValue()).toBe(title);
    expect(await page.getByLabel('Boundary A/B').inputValue()).toBe('2,3');
    await page.getByLabel('Boundary C/D').fill('7,1');
    await page.getByRole('button', { name: 'Enter limit set' }).click();
    const row = page.getByRole('row').filter({ hasText: title });
    await row.waitFor();
    expect(await row.getByRole('cell').allInnerTexts()).toEqual(
      expect.arrayContaining(['2.3', '4.5', '7.1', 'Contract of the mill fans']),
    );
    expect(await offered(page, title)).toBe(1);
    await page.goto(baseUrl() + routes.limitSets());
    await page
      .getByLabel('Limit set', { exact: true })
      .selectOption({ label: `${title}, 2026 (0\u00a0machines)` });
    await page.getByLabel('Why?').fill('A newer contract');
    await page.getByRole('button', { name: 'Retire limit set' }).click();
    await page.getByText('No machine is judged by it.').waitFor();
    await row.getByText('retired').waitFor();
    await expectAccessible(page);
    expect(await offered(page, title)).toBe(0);
    expect(errors).toEqual([]);
    await close();
  });

  it('are read by a reader, who is offered no form', async () => {
    const { page, close } = await openPage(browser, WIDTHS.phone);
    await signInAs(page, 'reader');
    await page.goto(baseUrl() + routes.settings());
    expect(await textOf(page)).not.toContain('Who signs in');
    await page.getByRole('link', { name: 'Limit sets' }).click();
    await page.getByRole('heading', { level: 1, name: 'Limit sets' }).waitFor();
    expect(await textOf(page)).toContain('Check against your copy of the standard');
    expect(await page.getByRole('main').getByRole('textbox').count()).toBe(0);
    await close();
  });
});
