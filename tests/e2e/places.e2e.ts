import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ROLES, type Role } from '@/lib/domain/access/permissions';
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

/** The places that everybody reads, and a page of each kind below them, found by its links. */
async function addresses(page: Page): Promise<string[]> {
  await page.goto(baseUrl() + routes.plantBook());
  const machine = await firstLink(page, /^\/machines\/\d+$/);
  await page.goto(baseUrl() + machine);
  const point = await firstLink(page, /^\/points\/\d+$/);
  const reading = await firstLink(page, /^\/readings\/\d+$/);
  await page.goto(baseUrl() + routes.balanceJobs());
  const jobs = await allLinks(page, /^\/balance-jobs\/\d+$/);
  await page.goto(baseUrl() + routes.inTray());
  const upload = await firstLink(page, /^\/in-tray\/\d+$/);
  const closed = jobs.at(-1) ?? '';
  return [
    routes.today(),
    routes.plantBook(),
    routes.plantBook('?layout=tree'),
    machine,
    `${machine}/history`,
    point,
    reading,
    routes.inTray(),
    upload,
    routes.balanceJobs(),
    jobs[0] ?? '',
    closed,
    `${closed}/record`,
    routes.verifyRecord(),
    routes.verifyRecord('4f0a 91c2 77de 0b13'),
    routes.verifyRecord('no code'),
    routes.dueBoard(),
    routes.workbench(''),
    ...[
      'two-planes',
      'tolerance',
      'split',
      'trial-weight',
      'without-phase',
      'pieces',
      'combine',
      'six-places',
    ].map((tool) => routes.workbench(`?tool=${tool}`)),
    routes.settings(),
    routes.limitSets(),
    routes.styleSheet(),
  ];
}

async function allLinks(page: Page, wanted: RegExp): Promise<string[]> {
  const hrefs = await page
    .getByRole('main')
    .getByRole('link')
    .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
  return hrefs.filter((href) => wanted.test(href));
}

async function firstLink(page: Page, wanted: RegExp): Promise<string> {
  const [first] = await allLinks(page, wanted);
  if (first === undefined) throw new Error(`no link like ${wanted.source} on ${page.url()}`);
  return first;
}

describe('every place', () => {
  it.each(Object.entries(WIDTHS))(
    'is accessible, fits its window and complains of nothing on a %s',
    async (_name, width) => {
      const { page, errors, close } = await openPage(browser, width);
      await signInAs(page, 'engineer');
      const forms = [routes.newMachine(), routes.newUpload()];
      for (const address of [...(await addresses(page)), ...forms]) {
        const answer = await page.goto(baseUrl() + address, { waitUntil: 'load' });
        expect(answer?.status(), address).toBe(200);
        await page.getByRole('heading', { level: 1 }).waitFor();
        await expectAccessible(page);
        await expectNoSidewaysScroll(page);
        expect(errors, address).toEqual([]);
      }
      await close();
    },
  );

  it('is dark where the person’s screen is, and as readable', async () => {
    const { page, close } = await openPage(browser);
    await page.emulateMedia({ colorScheme: 'dark' });
    await signInAs(page, 'engineer');
    for (const address of [routes.today(), routes.dueBoard(), routes.styleSheet()]) {
      await page.goto(baseUrl() + address);
      await expectAccessible(page);
    }
    await close();
  });
});

describe('roles', () => {
  const forbidden: Readonly<Record<string, readonly Role[]>> = {
    [routes.people()]: ['reader', 'technician', 'engineer', 'planner'],
    [routes.newMachine()]: ['reader', 'technician', 'planner'],
    [routes.newUpload()]: ['reader', 'planner'],
  };

  it.each(ROLES)('%s: opens what the role may, and is told where it may not', async (role) => {
    const { page, close } = await openPage(browser);
    await signInAs(page, role);
    for (const [address, roles] of Object.entries(forbidden)) {
      const answer = await page.goto(baseUrl() + address);
      expect(answer?.status(), `${role} ${address}`).toBe(roles.includes(role) ? 403 : 200);
    }
    await page.goto(baseUrl() + routes.plantBook());
    const mayEnter = role === 'engineer' || role === 'administrator';
    expect(await page.getByRole('link', { name: 'Enter a machine' }).count()).toBe(
      mayEnter ? 1 : 0,
    );
    await close();
  });

  it('nobody signed in is led to sign in, and an address of the data answers 401', async () => {
    const { page, close } = await openPage(browser);
    await page.goto(baseUrl() + routes.dueBoard());
    expect(new URL(page.url()).pathname).toBe(routes.signIn());
    const answer = await page.request.get(baseUrl() + routes.api.pointTrend(1));
    expect(answer.status()).toBe(401);
    await close();
  });

  it('signing out ends the session on the server: the cookie kept opens nothing', async () => {
    const { page, close } = await openPage(browser);
    await signInAs(page, 'reader');
    const cookies = await page.context().cookies();
    await page.getByRole('button', { name: /Rune Holt/ }).click();
    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.waitForURL(/\/sign-in/);
    await page.context().addCookies(cookies);
    await page.goto(baseUrl() + routes.plantBook());
    expect(new URL(page.url()).pathname).toBe(routes.signIn());
    await close();
  });
});

describe('another site', () => {
  it('is not found by any address, and looks as if nothing had ever been there', async () => {
    const { page: own, close: closeOwn } = await openPage(browser);
    await signInAs(own, 'engineer');
    await own.goto(baseUrl() + routes.plantBook('?area=Sundvik+Mill+%2F+Boiler+house'));
    const machine = await firstLink(own, /^\/machines\/\d+$/);
    await own.goto(baseUrl() + machine);
    const point = await firstLink(own, /^\/points\/\d+$/);
    const reading = await firstLink(own, /^\/readings\/\d+$/);
    await closeOwn();

    const { page, close } = await openPage(browser);
    await signIn(page, baseUrl(), 'nora.field@northbank.example', 'copper-lantern-41');
    const missing = [
      machine,
      point,
      reading,
      routes.machine(999_999),
      routes.machine(99_999_999_999),
      routes.balanceJob(99_999_999_999),
      `${machine}/new-balance-job`,
    ];
    for (const address of missing) {
      const answer = await page.goto(baseUrl() + address);
      expect(answer?.status(), address).toBe(404);
      expect(await textOf(page)).toMatch(/not found|no such|nothing/i);
    }
    const pointId = Number(/\d+$/.exec(point)?.[0]);
    const recordId = Number(/\d+$/.exec(reading)?.[0]);
    const data = [
      routes.api.pointTrend(pointId),
      routes.api.waveform(recordId),
      routes.api.spectrum(recordId),
    ];
    for (const address of data)
      expect((await page.request.get(baseUrl() + address)).status(), address).toBe(404);
    await close();
  });
});
