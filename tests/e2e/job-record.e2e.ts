import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { routes } from '@/lib/routes';
import { expectAccessible, openPage, textOf } from '@/tests/support/browser-page';
import { baseUrl, openChromium } from '@/tests/support/chromium';
import { plainText, readPdf } from '@/tests/support/read-pdf';
import { signInAs } from './people';

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

/** The record of a signed job of the demo plant, found by the list’s links. */
async function signedRecord(page: Page): Promise<string> {
  await page.goto(baseUrl() + routes.balanceJobs());
  const row = page.getByRole('row').filter({ hasText: 'KX-2' }).filter({ hasText: 'signed' });
  const href = await row.getByRole('link').first().getAttribute('href');
  return `${baseUrl()}${href ?? ''}/record`;
}

describe('a signed job record', () => {
  it('takes a remark, is checked by its code, and a changed file is found out', async () => {
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    const record = await signedRecord(page);
    await page.goto(record);
    const remark = `The clamp was looked at again (${Date.now()}).`;
    await page.getByLabel('Remark').fill(remark);
    await page.getByRole('button', { name: 'Add the addendum' }).click();
    await page.getByText('Write why it is added.').first().waitFor();
    expect(await page.getByLabel('Remark').inputValue()).toBe(remark);
    await expectAccessible(page);
    await page.getByLabel('Why is it added?').fill('Asked for by the area owner.');
    await page.getByRole('button', { name: 'Add the addendum' }).click();
    await page.getByText(/^Addendum \d+ added$/).waitFor();
    expect(await textOf(page)).toContain(remark);

    await page.getByRole('link', { name: 'Is it as signed?' }).click();
    await page.getByText('This record is as signed').waitFor();
    await expectAccessible(page);
    const jobId = Number(/balance-jobs\/(\d+)/.exec(record)?.[1]);
    const file = await page.request.get(baseUrl() + routes.api.signedRecord(jobId));
    const changed = (await file.text()).replace(/"massG":\d+/, '"massG":999');
    await page.getByLabel('Job record as JSON').setInputFiles({
      name: 'kept.json',
      mimeType: 'application/json',
      buffer: Buffer.from(changed),
    });
    await page.getByText('kept.json is not what was signed').waitFor();
    expect(await textOf(page)).toContain('massG');
    await expectAccessible(page);
    expect(errors).toEqual([]);
    await close();
  });

  it('comes as a PDF that says what the page says', async () => {
    const { page, close } = await openPage(browser);
    await signInAs(page, 'reader');
    await page.goto(await signedRecord(page));
    const said = plainText(await textOf(page));
    const href = await page.getByRole('link', { name: 'PDF, Letter' }).getAttribute('href');
    const answer = await page.request.get(`${baseUrl()}${href ?? ''}`);
    expect(answer.headers()['content-type']).toBe('application/pdf');
    const pages = await readPdf(await answer.body());
    const text = pages.map((one) => one.text).join(' ');
    const hash = /[0-9a-f]{64}/.exec(said)?.[0] ?? 'no hash';
    for (const { text: one } of pages) expect(one).toContain(hash);
    for (const value of said.match(/\d+\.\d+ g\b/g) ?? ['no mass']) expect(text).toContain(value);
    const refused = await page.request.get(`${baseUrl()}${(href ?? '').replace('letter', 'a3')}`);
    expect(refused.status()).toBe(400);
    await close();
  });
});
