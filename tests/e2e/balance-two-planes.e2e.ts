import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import data from '@/tests/reference/data/balancing-scenarios.json';
import {
  expectAccessible,
  expectNoSidewaysScroll,
  openPage,
  textOf,
  WIDTHS,
} from '@/tests/support/browser-page';
import { openChromium } from '@/tests/support/chromium';
import { openTwoPlaneJob, settleTrial, typeRun, typeWeight } from './balance-journey';
import { enterMachine } from './machine-journey';
import { signInAs } from './people';

// Scenario S02: invented plant; expected values computed by an independent implementation.
const { inputs, expected } = data.scenarios.S02;

let browser: Browser;
let address: string;

beforeAll(async () => {
  browser = await openChromium();
  const { page, close } = await openPage(browser);
  await signInAs(page, 'engineer');
  address = await enterMachine(page, {
    tag: `KX-${Date.now() % 1_000_000}`,
    speeds: { lowest: 950, highest: 1010, usual: 990 },
    massKg: 640,
    spanM: 1.9,
    centreM: 0.95,
    planes: [
      { name: 'L', radiusMm: 700, fromAM: 0.4 },
      { name: 'R', radiusMm: 700, fromAM: 1.5 },
    ],
  });
  await close();
});

afterAll(() => browser.close());

it('carries a two-plane job from sign-in to the signed record, with the values of S02', async () => {
  const { page, errors, close } = await openPage(browser);
  await signInAs(page, 'technician');
  await openTwoPlaneJob(page, `${address}/new-balance-job`);
  await expectAccessible(page);
  const jobAddress = page.url();

  await typeRun(page, 'Record base run', inputs.base);
  await page.getByLabel(/Why you go on/).fill('One base run: the stop is short.');
  await page.getByRole('button', { name: 'Accept the base' }).click();

  for (const trial of inputs.trial) {
    await typeWeight(page, `Record trial weight in plane ${trial.plane}`, trial);
    await typeRun(page, 'Record trial run', trial.run);
    await settleTrial(page, /taken off/);
  }

  const use = page.getByRole('button', { name: 'Use this answer' });
  await use.waitFor();
  await expectAccessible(page);
  const answer = await textOf(page);
  expect(answer).toContain('92.2 g at 124°');
  expect(answer).toContain('72.5 g at 256°');
  // Arc along the rim: 2π·700 mm·123.9/360 = 1513.7 mm.
  expect(answer).toContain('124° against rotation = 1514 mm along the rim at r 700 mm');
  await use.click();

  for (const weight of inputs.installed)
    await typeWeight(page, `Record weight in plane ${weight.plane}`, weight);
  await typeRun(page, 'Record check run', inputs.check_run);

  const sign = page.getByRole('button', { name: 'Sign the job record' });
  await sign.waitFor();
  const sheet = await textOf(page);
  for (const reduction of expected.reduction_pct)
    expect(sheet, `reduction ${reduction} %`).toMatch(
      new RegExp(`${reduction.toFixed(1).replace('.', '\\.')}|${Math.round(reduction)}\\s%`),
    );
  await expectAccessible(page);
  for (const permanent of await page.getByLabel(/is permanent/).all()) await permanent.check();
  const form = page.locator('form').filter({ has: sign });
  await form.getByLabel('It is so.').check();
  await form.getByLabel(/Area owner/).fill('Rune Holt');
  await form.getByLabel(/Why it is signed although/).fill('The prediction was missed by little.');
  await sign.click();

  await page.goto(`${jobAddress}/record`);
  await page
    .getByText(/[0-9a-f]{64}|content/i)
    .first()
    .waitFor();
  const record = await textOf(page);
  expect(record).toContain('90.0 g');
  expect(record).toContain('75.0 g');
  expect(record).toMatch(/against.rotation/);
  await expectAccessible(page);

  await page.goto(address);
  const sheetOfMachine = await textOf(page);
  expect(sheetOfMachine).toContain('90.0 g');
  expect(errors).toEqual([]);
  await close();
});

it('is read beside the machine on a phone, by somebody who may only read', async () => {
  const { page, errors, close } = await openPage(browser, WIDTHS.phone);
  await signInAs(page, 'reader');
  await page.goto(address);
  await expectNoSidewaysScroll(page);
  expect(
    await page.getByRole('link', { name: /new balance job|open a balance job/i }).count(),
  ).toBe(0);
  await page.goto(`${address}/new-balance-job`);
  expect(await page.getByRole('button', { name: 'Open balance job' }).count()).toBe(0);
  expect(errors.filter((error) => !error.includes('403'))).toEqual([]);
  await close();
});
