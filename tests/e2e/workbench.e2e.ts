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
    // The button stands far below the answer: it is brought into sight.
    const top = (await page.getByRole('heading', { name: 'Answer' }).boundingBox())?.y ?? NaN;
    expect(top).toBeGreaterThan(0);
    expect(top).toBeLessThan(300);
    expect(said).not.toContain('This is not what is typed now');
    await page.locator('[name="trials.1.massG"]').fill('41');
    expect(await textOf(page)).toContain('This is not what is typed now');
    await expectAccessible(page);
    await page.setViewportSize({ width: WIDTHS.phone, height: 800 });
    await expectNoSidewaysScroll(page);
    expect(errors).toEqual([]);
    await close();
  });

  it('gives the place as it was counted too, and no weight where planes act alike', async () => {
    const { page, errors, close } = await openPage(browser, WIDTHS.phone);
    await signInAs(page, 'engineer');
    await page.goto(baseUrl() + routes.workbench('?tool=two-planes'));
    await typeRuns(page);
    await page.getByLabel(/^lag/).check();
    await page.getByLabel('with rotation', { exact: true }).check();
    const compute = page.getByRole('button', { name: 'Compute' });
    await compute.click();
    await page.getByRole('heading', { name: 'Answer' }).waitFor();
    const table = page.getByRole('region', { name: 'Add to what is on the rotor now' });
    const heads = await table.getByRole('columnheader').allInnerTexts();
    const row = table.getByRole('row', { name: /^1 / });
    const cell = (head: string) => row.locator('th,td').nth(heads.indexOf(head)).innerText();
    // The trial weights of S02 hang at 90°: counted with rotation that is 270°, half a turn further.
    expect(await cell('at, against rotation')).toBe('303.9°');
    expect(await cell('at, with rotation, as you count')).toBe('56.1°');
    await expectAccessible(page);
    await expectNoSidewaysScroll(page);
    const [first] = inputs.trial;
    if (!first) throw new Error('S02 has trials');
    await type(page, 'trials.1.readings', first.run);
    await compute.click();
    await page.getByText('the planes cannot be told apart').waitFor();
    expect(await page.getByRole('heading', { name: 'Answer' }).count()).toBe(0);
    await expectAccessible(page);
    expect(errors).toEqual([]);
    await close();
  });

  it.each([WIDTHS.desk, WIDTHS.phone])(
    'computes a tolerance and a split %i px wide',
    async (width) => {
      const { page, errors, close } = await openPage(browser, width);
      await signInAs(page, 'reader');
      await page.goto(baseUrl() + routes.workbench('?tool=tolerance'));
      await fillIn(page, {
        gradeMmS: '6.3',
        massKg: '640',
        speedRpm: '990',
        apartM: '1.9',
        massCentreFromAM: '0.8',
        residualAGmm: '22000',
        residualBGmm: '17000',
      });
      await page.keyboard.press('Enter');
      await page.getByRole('heading', { name: 'Permissible residual unbalance' }).waitFor();
      // Lever checks of the reference data: 38 891.7 g·mm, of it 22 516 at A and 16 375 at B.
      expect(await textOf(page)).toMatch(/A\s+22516\s+22000\s+within/);
      expect(await textOf(page)).toMatch(/B\s+16375\s+17000\s+above what is allowed/);
      await expectAccessible(page);
      await expectNoSidewaysScroll(page);

      await page.goto(baseUrl() + routes.workbench('?tool=split'));
      await fillIn(page, { massG: '23.5', angleDeg: '137', radiusMm: '500', positions: '9' });
      await fillIn(page, { firstDeg: '720', speedRpm: '1480' });
      await page.getByLabel('clockwise', { exact: true }).check();
      for (const sense of ['angleSense', 'numbered'])
        await page.locator(`[name="${sense}"][value="against"]`).check();
      await page.getByRole('button', { name: 'Compute' }).click();
      await page.getByRole('button', { name: 'An angle runs from 0 to 360 degrees' }).click();
      expect(await page.locator('[name="firstDeg"]').inputValue()).toBe('720');
      await page.keyboard.press('ControlOrMeta+A');
      await page.keyboard.type('0');
      await page.keyboard.press('Enter');
      await page.getByRole('heading', { name: 'Shares' }).waitFor();
      // WA-05 of the reference data: 14.28 g on blade 4, 10.69 g on blade 5.
      expect(await textOf(page)).toMatch(/4\s+14\.3 g\s+120\.0°/);
      expect(await textOf(page)).toMatch(/5\s+10\.7 g\s+160\.0°/);
      await expectAccessible(page);
      await expectNoSidewaysScroll(page);
      expect(errors).toEqual([]);
      await close();
    },
  );
});

async function fillIn(page: Page, values: Readonly<Record<string, string>>): Promise<void> {
  for (const [name, value] of Object.entries(values))
    await page.locator(`[name="${name}"]`).fill(value);
}
