import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
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
import { enterMachine } from './machine-journey';
import { signInAs } from './people';
import { confirmFile, sendFile } from './upload-journey';

// Measured records of the Case Western Reserve University Bearing Data Center. They state no
// licence, so they are read from the folder EVENRUN_RECORDS names and never copied here.
const folder = process.env.EVENRUN_RECORDS ?? '';
const measured = join(folder, 'outer_race_de_12k.csv');
const isPresent = folder !== '' && existsSync(measured);
if (!isPresent)
  console.info('Skipped: EVENRUN_RECORDS does not name a folder with the measured records.');

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

/** Enters a machine of that speed and hands back its first point and its page. */
async function rigOf(tag: string, usual: number): Promise<{ pointId: number; address: string }> {
  const { page, close } = await openPage(browser);
  await signInAs(page, 'engineer');
  const speeds = { lowest: usual - 60, highest: usual + 60, usual };
  const planes = [{ name: 'W', radiusMm: 300, fromAM: 0.6 }];
  const machine = { tag, speeds, massKg: 120, spanM: 1.2, centreM: 0.6, planes };
  const address = await enterMachine(page, machine);
  const href = await page
    .getByRole('link', { name: 'A-H', exact: true })
    .last()
    .getAttribute('href');
  await close();
  return { pointId: Number(/\d+$/.exec(href ?? '')?.[0]), address };
}

/** A row of the values table: what stands in it behind its heading. */
async function valueOf(page: Page, name: string): Promise<string> {
  const row = page.getByRole('row').filter({ has: page.getByRole('rowheader', { name }) });
  return (await row.first().innerText()).replaceAll('\u00a0', ' ');
}

const unique = (tag: string) => `${tag}-${Date.now() % 1_000_000}`;

describe.skipIf(!isPresent)('a measured record', () => {
  it('is dropped, confirmed, and seen as a spectrum with its fault', async () => {
    const { pointId } = await rigOf(unique('MR'), 1797);
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await sendFile(page, pointId, {
      name: unique('outer_race') + '.csv',
      mimeType: 'text/csv',
      buffer: Buffer.concat([readFileSync(measured), Buffer.from(`# ${unique('sent')}\n`)]),
    });
    await expectAccessible(page);
    await confirmFile(page);
    // What is published of this record: kurtosis of the first 120 000 samples about 7.65.
    expect(await valueOf(page, 'Kurtosis')).toMatch(/7\.6[0-9]/);
    await page.getByRole('link', { name: 'Envelope' }).click();
    await page.waitForURL(/spectrum=envelope/);
    await page.getByText(/^Hann, one block of 120000 samples, of 2000 to/).waitFor();
    await page.locator('figure svg').last().waitFor();
    await expectAccessible(page);
    // The outer race is passed 107.3 times a second (bearing geometry, 1796 r/min).
    expect(await textOf(page)).toMatch(/10[78](\.\d+)? Hz/);
    expect(errors).toEqual([]);
    await close();
  });
});

describe('a record with a tacho', () => {
  // Scenario S17: an invented record; expected values computed by an independent implementation.
  const file = new URL('../reference/data/S17_EF101_B_H_tacho.csv', import.meta.url);

  it('gives speed, 1x size and lag, on the reading page and on the trend of its point', async () => {
    const { pointId, address } = await rigOf(unique('EF'), 1480);
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    const name = unique('EF101') + '.csv';
    const buffer = Buffer.concat([readFileSync(file), Buffer.from('\n')]);
    await sendFile(page, pointId, { name, mimeType: 'text/csv', buffer });
    await confirmFile(page);
    expect(await valueOf(page, 'Overall velocity')).toMatch(/3\.4\d?/);
    expect(await valueOf(page, '1x')).toMatch(/3\.2\d[\s\S]*21[78]°\s*lag/);
    const reading = page.url();
    await page.goto(baseUrl() + routes.point(pointId));
    await page.locator('figure svg').first().waitFor();
    await expectAccessible(page);
    await page.goto(address);
    expect(await textOf(page)).toMatch(/3\.4\d mm\/s rms/);
    // The very same bytes again are refused with a link to what they became.
    await page.goto(baseUrl() + routes.newUpload(`?point=${pointId}`));
    await page.getByLabel('Files to upload').setInputFiles({ name, mimeType: 'text/csv', buffer });
    await page.getByRole('button', { name: /^Send/ }).click();
    await page.getByRole('link', { name: 'Open that file' }).click();
    await page.waitForURL(/\/(in-tray|readings)\/\d+/);
    expect(errors).toEqual([]);
    await close();
    await seenOnPhone(reading);
  });

  async function seenOnPhone(reading: string): Promise<void> {
    const { page, errors, close } = await openPage(browser, WIDTHS.phone);
    await signInAs(page, 'reader');
    await page.goto(reading);
    await page.locator('figure svg').last().waitFor();
    await expectNoSidewaysScroll(page);
    expect(await page.getByRole('button', { name: /line through/i }).count()).toBe(0);
    expect(errors).toEqual([]);
    await close();
  }
});

describe('a file that is no record', () => {
  it('is refused in words, and nothing is lost', async () => {
    const { pointId } = await rigOf(unique('NR'), 1480);
    const { page, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await page.goto(baseUrl() + routes.newUpload(`?point=${pointId}`));
    const png = Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex');
    const files = [
      { name: 'picture.csv', mimeType: 'text/csv', buffer: png },
      { name: 'empty.csv', mimeType: 'text/csv', buffer: Buffer.alloc(0) },
    ];
    await page.getByLabel('Files to upload').setInputFiles(files);
    await page.getByRole('button', { name: 'Send 2 files' }).click();
    await page
      .getByText(/picture/i)
      .first()
      .waitFor();
    await page.getByText('2 of 2 files').waitFor();
    const said = await textOf(page);
    expect(said).toMatch(/picture\.csv[\s\S]*(PNG|picture|image)/i);
    expect(said).toMatch(/empty\.csv[\s\S]*empty/i);
    await expectAccessible(page);
    await close();
  });
});
