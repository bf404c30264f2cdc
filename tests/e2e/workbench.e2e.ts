import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { routes } from '@/lib/routes';
import data from '@/tests/reference/data/balancing-scenarios.json';
import {
  expectAccessible,
  expectNoSidewaysScroll,
  openPage,
  textOf,
  WIDTHS,
} from '@/tests/support/browser-page';
import { baseUrl, openChromium } from '@/tests/support/chromium';
import { signInAs } from './people';

// Scenario S02: invented plant; expected values computed by an independent implementation.
const { inputs } = data.scenarios.S02;

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

async function type(page: Page, at: string, readings: readonly { amp: number; deg: number }[]) {
  for (const [index, { amp, deg }] of readings.entries()) {
    await page.locator(`[name="${at}.${index}.amplitude"]`).fill(String(amp));
    await page.locator(`[name="${at}.${index}.phaseDeg"]`).fill(String(deg));
  }
}

async function typeRuns(page: Page): Promise<void> {
  await page.getByLabel('mm/s rms').check();
  await page.getByLabel('against rotation').check();
  await page.getByLabel('clockwise', { exact: true }).check();
  await page.getByLabel('Speed of the runs').fill('990');
  await type(page, 'base', inputs.base);
  for (const [index, trial] of inputs.trial.entries()) {
    const at = `trials.${index}`;
    await page.locator(`[name="${at}.massG"]`).fill(String(trial.g));
    await page.locator(`[name="${at}.radiusMm"]`).fill(String(trial.radius_mm));
    await page.locator(`[name="${at}.angleDeg"]`).fill(String(trial.deg));
    await page.locator(`[name="planes.${index}.radiusMm"]`).fill(String(trial.radius_mm));
    await type(page, `${at}.readings`, trial.run);
    await page.locator(`[name="${at}.stays"][value="taken off"]`).check();
  }
}

describe('the workbench', () => {
  it('assumes no sense, loses nothing typed, and then gives the answer of S02', async () => {
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await page.goto(baseUrl() + routes.workbench('?tool=two-planes'));
    await typeRuns(page);
    const compute = page.getByRole('button', { name: 'Compute' });
    await compute.click();
    await page.getByRole('heading', { name: 'Nothing was computed' }).waitFor();
    expect(await textOf(page)).toContain(
      'Say whether your instrument shows phase as lag or as lead.',
    );
    expect(await page.locator('[name="trials.1.massG"]').inputValue()).toBe('40');
    expect(await page.getByLabel('mm/s rms').isChecked()).toBe(true);
    await expectAccessible(page);
    await page.getByLabel(/^lag/).check();
    await compute.click();
    await page.getByRole('heading', { name: 'Answer' }).waitFor();
    const said = await textOf(page);
    expect(said).toContain('92.2 g at 124°');
    expect(said).toContain('72.5 g at 256°');
    expect(await page.locator('[name="trials.1.massG"]').inputValue()).toBe('40');
    expect(await page.getByLabel(/^lag/).isChecked()).toBe(true);
    await expectAccessible(page);
    await page.setViewportSize({ width: WIDTHS.phone, height: 800 });
    await expectNoSidewaysScroll(page);
    expect(errors).toEqual([]);
    await close();
  });
});
