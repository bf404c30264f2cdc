import type { Page } from 'playwright-core';
import { routes } from '@/lib/routes';
import { baseUrl } from '@/tests/support/chromium';

export type SentFile = { name: string; mimeType: string; buffer: Buffer };

/** A day ago on the clock a datetime-local field reads, a minute of margin either way. */
function yesterday(): string {
  return new Date(Date.now() - 86_400_000).toISOString().slice(0, 19);
}

/** Sends one file for a point and opens what was proposed for it. */
export async function sendFile(page: Page, pointId: number, file: SentFile): Promise<void> {
  await page.goto(baseUrl() + routes.newUpload(`?point=${pointId}`));
  await page.getByLabel('Files to upload').setInputFiles(file);
  await page.getByRole('button', { name: /^Send/ }).click();
  await page.getByRole('link', { name: `Confirm ${file.name}` }).click();
  await page.getByRole('button', { name: 'Confirm record' }).waitFor();
}

/** Says when it was taken, confirms, and waits for the reading's page. */
export async function confirmFile(page: Page): Promise<void> {
  await page.getByLabel('Taken at').fill(yesterday());
  await page.getByRole('button', { name: 'Confirm record' }).click();
  await page.waitForURL(/\/readings\/\d+/);
  await page.getByRole('heading', { name: /^Spectrum/ }).waitFor();
}
