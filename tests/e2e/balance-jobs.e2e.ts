import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import data from '@/tests/reference/data/balancing-scenarios.json';
import {
  expectAccessible,
  expectNoSidewaysScroll,
  openPage,
  textOf,
  WIDTHS,
} from '@/tests/support/browser-page';
import { openChromium } from '@/tests/support/chromium';
import { pngFile } from '@/tests/server/balance-job/photo-files';
import {
  acceptBase,
  openJob,
  settleTrial,
  signJob,
  typeRun,
  typeWeight,
  takeAnswer,
} from './balance-journey';
import { enteredMachine } from './machine-journey';
import { signInAs } from './people';

// Scenarios S01, S02 and S03: invented plant; expected values computed by an independent implementation.
const { S01, S02, S03 } = data.scenarios;

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

describe('S01: one plane, three base runs, the trial taken off, one trim', () => {
  it('gives answer, trim and ledger through the screens', async () => {
    const address = await enteredMachine(browser, {
      tag: 'EF',
      speeds: { lowest: 1460, highest: 1500, usual: 1480 },
      massKg: 210,
      spanM: 1.2,
      centreM: 0.6,
      planes: [{ name: 'W', radiusMm: 400, fromAM: 0.6 }],
    });
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await openJob(page, address, 'One plane');
    const { inputs } = S01;
    for (const [index, base] of inputs.repeat_base_runs.entries()) {
      await page.getByRole('heading', { name: `Next: base run ${index + 1}` }).waitFor();
      await typeRun(page, 'Record base run', [base], base.speed);
    }
    await page.getByText(/repeats well/).waitFor();
    expect(await textOf(page)).toContain('mean 3.87 mm/s rms at 219° lag');
    await acceptBase(page, '');
    await typeWeight(page, 'Record trial weight in plane W', inputs.trial);
    await typeRun(page, 'Record trial run', [inputs.trial_run], inputs.trial_run.speed);
    await settleTrial(page, /taken off/);
    expect(await takeAnswer(page, 'Use this answer')).toContain('26.3 g at 36°');
    const photo = await pngFile('fan.png', 800, 600);
    const buffer = Buffer.from(await photo.arrayBuffer());
    await typeWeight(page, 'Record weight in plane W', {
      ...inputs.installed_1,
      photo: { name: photo.name, mimeType: photo.type, buffer },
    });
    // 26 g at 35°, as the scenario has it fitted.
    const thumbnail = page.getByAltText(/Photo of 26\.0\sg in plane W at 35°\sagainst\srotation/);
    await thumbnail.scrollIntoViewIfNeeded();
    const loadedPx = (image: HTMLImageElement) => image.decode().then(() => image.naturalWidth);
    expect(await thumbnail.evaluate(loadedPx)).toBe(320);
    await expectAccessible(page);
    await typeRun(page, 'Record check run', [inputs.check_run_1], inputs.check_run_1.speed);
    const trim = await takeAnswer(page, 'Use this trim');
    // 2.85 g at 297.1°, shown to a tenth each.
    expect(trim).toMatch(/2\.[89] g\s+297\.\d°/);
    await typeWeight(page, 'Record weight in plane W', inputs.installed_2);
    await typeRun(page, 'Record check run', [inputs.check_run_2], inputs.check_run_2.speed);
    await signJob(page, 'Small remaining miss.');
    await page.goto(`${page.url()}/record`);
    // Large among the photos of the frozen record.
    expect(await page.getByAltText(/^Photo of 26\.0/).count()).toBe(1);
    await expectAccessible(page);
    await page.goto(address);
    const sheet = await textOf(page);
    // The ledger's sum: 10 259.9 g·mm at 28.4°, as one weight 25.65 g on 400 mm.
    expect(sheet).toMatch(/25\.[67] g/);
    expect(sheet).toMatch(/28(\.4)?°/);
    expect(errors).toEqual([]);
    await close();
  });
});

describe('S02: two planes, both trials taken off', () => {
  let address: string;

  beforeAll(async () => {
    address = await enteredMachine(browser, {
      tag: 'KX',
      speeds: { lowest: 950, highest: 1010, usual: 990 },
      massKg: 640,
      spanM: 1.9,
      centreM: 0.95,
      planes: [
        { name: 'L', radiusMm: 700, fromAM: 0.4 },
        { name: 'R', radiusMm: 700, fromAM: 1.5 },
      ],
    });
  });

  it('goes from sign-in to the signed record, with the expected values', async () => {
    const { inputs, expected } = S02;
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await openJob(page, address, 'Two planes');
    await expectAccessible(page);
    const jobAddress = page.url();
    await typeRun(page, 'Record base run', inputs.base);
    await acceptBase(page, 'One base run: the stop is short.');
    for (const trial of inputs.trial) {
      await typeWeight(page, `Record trial weight in plane ${trial.plane}`, trial);
      await typeRun(page, 'Record trial run', trial.run);
      await settleTrial(page, /taken off/);
    }
    const answer = await takeAnswer(page, 'Use this answer');
    expect(answer).toContain('92.2 g at 124°');
    expect(answer).toContain('72.5 g at 256°');
    // Arc along the rim: 2π·700 mm·123.9/360 = 1513.7 mm.
    expect(answer).toContain('124° against rotation = 1514 mm along the rim at r 700 mm');
    for (const weight of inputs.installed)
      await typeWeight(page, `Record weight in plane ${weight.plane}`, weight);
    await typeRun(page, 'Record check run', inputs.check_run);
    await page.getByRole('button', { name: 'Sign the job record' }).waitFor();
    await expectAccessible(page);
    const sheet = await textOf(page);
    for (const reduction of expected.reduction_pct) expect(sheet).toContain(reduction.toFixed(1));
    await signJob(page, 'The prediction was missed by little.');

    await page.goto(`${jobAddress}/record`);
    const record = await textOf(page);
    for (const said of ['90.0 g', '75.0 g', 'Nora Field', 'against rotation'])
      expect(record).toContain(said);
    expect(record).toMatch(/[0-9a-f]{64}/);
    await expectAccessible(page);
    await page.goto(address);
    expect(await textOf(page)).toContain('90.0 g');
    expect(errors).toEqual([]);
    await close();
  });

  it('is read on a phone by somebody who may only read', async () => {
    const { page, errors, close } = await openPage(browser, WIDTHS.phone);
    await signInAs(page, 'reader');
    await page.goto(address);
    await expectNoSidewaysScroll(page);
    expect(errors).toEqual([]);
    const answer = await page.goto(`${address}/new-balance-job`);
    expect(answer?.status()).toBe(403);
    await close();
  });
});

describe('S03: both trial weights stay on', () => {
  it('says what to add to what is on it now, and the total from as found', async () => {
    const address = await enteredMachine(browser, {
      tag: 'CB',
      speeds: { lowest: 1470, highest: 1510, usual: 1490 },
      massKg: 420,
      spanM: 1.5,
      centreM: 0.7,
      planes: [
        { name: '1', radiusMm: 280, fromAM: 0.3 },
        { name: '2', radiusMm: 280, fromAM: 1.15 },
      ],
    });
    const { inputs, expected } = S03;
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await openJob(page, address, 'Two planes');
    await typeRun(page, 'Record base run', inputs.base);
    await acceptBase(page, 'One base run.');
    for (const trial of inputs.trial) {
      await typeWeight(page, `Record trial weight in plane ${trial.plane}`, trial);
      await typeRun(page, 'Record trial run', trial.run);
      await settleTrial(page, /stays on/);
    }
    const answer = await takeAnswer(page, 'Use this answer');
    for (const plane of [...expected.to_add_with_trials_staying, ...expected.total_from_as_found])
      expect(answer).toContain(`${plane.g.toFixed(1)} g`);
    expect(answer).toContain('110.2 g at 206°');
    expect(answer).toContain('70.1 g at 337°');
    for (const weight of inputs.installed_in_addition)
      await typeWeight(page, `Record weight in plane ${weight.plane}`, weight);
    await typeRun(page, 'Record check run', inputs.check_run);
    await page.getByRole('button', { name: 'Sign the job record' }).waitFor();
    const sheet = await textOf(page);
    for (const reduction of expected.check_run_reduction_pct)
      expect(sheet).toContain(reduction.toFixed(1));
    expect(errors).toEqual([]);
    await close();
  });
});
