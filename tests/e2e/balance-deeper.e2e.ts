import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { add, angleDeg, fromPolar, multiply, size, sum, ZERO } from '@/lib/domain/complex';
import data from '@/tests/reference/data/balancing-scenarios.json';
import {
  expectAccessible,
  expectNoSidewaysScroll,
  openPage,
  textOf,
  WIDTHS,
} from '@/tests/support/browser-page';
import { openChromium } from '@/tests/support/chromium';
import {
  acceptBase,
  askedOf,
  openJob,
  settleTrial,
  signJob,
  typeRun,
  typeWeight,
  takeAnswer,
  typeFound,
} from './balance-journey';
import { enteredMachine } from './machine-journey';
import { signInAs } from './people';

// Scenarios S04 and S05: invented plant; expected values computed by an independent implementation.
const { S04, S05 } = data.scenarios;

let browser: Browser;

beforeAll(async () => {
  browser = await openChromium();
});

afterAll(() => browser.close());

describe('the second balance of a rotor', () => {
  it('needs no trial run: the first weight fitted is the correction', async () => {
    const address = await enteredMachine(browser, {
      tag: 'RM',
      speeds: { lowest: 1465, highest: 1495, usual: 1485 },
      massKg: 300,
      spanM: 1.4,
      centreM: 0.7,
      planes: [{ name: 'W', radiusMm: 450, fromAM: 0.7 }],
    });
    const [past] = S05.inputs.past_jobs;
    if (!past) throw new Error('no past job');
    await firstBalance(address, past);

    // Beside the fan, on a phone.
    const { page, errors, close } = await openPage(browser, WIDTHS.phone);
    await signInAs(page, 'technician');
    await openJob(page, address, 'One plane');
    await typeRun(page, 'Record base run', [S05.inputs.base], 1485);
    await acceptBase(page, 'One base run.');
    const use = page.getByRole('button', { name: 'Use the coefficient book' });
    await use.waitFor();
    await expectAccessible(page);
    await expectNoSidewaysScroll(page);
    expect(await textOf(page)).toContain('one estimate');
    // Nothing is ticked beforehand, and a book of one estimate needs a reason.
    await use.click();
    await page
      .getByText(/Look at the sensors/)
      .first()
      .waitFor();
    const form = page.locator('form').filter({ has: use });
    for (const tick of await form.getByRole('checkbox').all()) await tick.check();
    await form.getByLabel(/Why do you rely on them/).fill('Same feet, same sensor, last month.');
    await use.click();
    // 4.39 mm/s at 107° over 0.162 mm/s per kg·mm at 26.4°, on 450 mm: 60.2 g at 260.6°.
    const [correction] = await askedOf(page);
    expect(correction?.g).toBeCloseTo(60.2, 0);
    expect(Math.abs((correction?.deg ?? 0) - 260.6)).toBeLessThan(1);
    await takeAnswer(page, 'Use this answer');
    await typeWeight(page, 'Record weight in plane W', { g: 60, radius_mm: 450, deg: 260 });
    await typeRun(page, 'Record check run', [S05.inputs.check_run], S05.inputs.check_run.speed);
    await signJob(page, 'Small remaining miss.');
    expect(await page.getByRole('main').innerText()).not.toContain('trial weight');
    expect(errors).toEqual([]);
    await close();
  });
});

type PastJob = (typeof S05.inputs.past_jobs)[number];

/** A job with a trial run, whose check run is as predicted. */
async function firstBalance(address: string, past: PastJob): Promise<void> {
  const { page, close } = await openPage(browser);
  await signInAs(page, 'technician');
  await openJob(page, address, 'One plane');
  await typeRun(page, 'Record base run', [past.base], past.speed);
  await acceptBase(page, 'One base run.');
  await typeWeight(page, 'Record trial weight in plane W', past.trial);
  await typeRun(page, 'Record trial run', [past.trial_run], past.speed);
  await settleTrial(page, /taken off/);
  const [correction] = await askedOf(page);
  await takeAnswer(page, 'Use this answer');
  if (!correction) throw new Error('no answer');
  await typeWeight(page, 'Record weight in plane W', { ...correction, radius_mm: 450 });
  await typeRun(page, 'Record check run', [{ amp: 0, deg: 0 }], past.speed);
  await signJob(page, 'Hardly anything is left.');
  await close();
}

describe('seven blades with limits, two of them used already', () => {
  it('names blades and pieces with the room that is left', async () => {
    const [wheel] = S04.machine.planes;
    if (!wheel) throw new Error('no wheel');
    const address = await enteredMachine(browser, {
      tag: 'AV',
      speeds: { lowest: 960, highest: 1000, usual: S04.machine.speed_r_min },
      massKg: S04.machine.rotor_mass_kg,
      grade: S04.machine.balance_grade,
      spanM: 1,
      centreM: 0.5,
      planes: [
        {
          ...{ name: 'B', radiusMm: wheel.radius_mm, fromAM: 0.5 },
          fixed: {
            ...{ positions: wheel.positions, firstDeg: wheel.blade_1_deg },
            ...{ maxG: wheel.max_g_per_pad, pieceG: wheel.piece_g },
          },
        },
      ],
    });
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await openJob(page, address, 'One plane');
    const at = { radius_mm: wheel.radius_mm };
    // The machine form labels positions by number; the ledger check comes before the first run.
    for (const [blade, g] of Object.entries(S04.machine.ledger_before))
      await typeFound(page, { ...at, g, position: positionOf(blade) });
    await typeRun(page, 'Record base run', [S04.inputs.base]);
    await acceptBase(page, 'One base run.');
    const trial = { ...at, g: S04.inputs.trial.g, position: positionOf('blade 1') };
    await typeWeight(page, 'Record trial weight in plane B', trial);
    await typeRun(page, 'Record trial run', [S04.inputs.trial.run]);
    await settleTrial(page, /taken off/);
    const proposed = page.getByRole('row', { name: /is proposed/ });
    await proposed.waitFor();
    const said = (await proposed.innerText()).replaceAll('\u00a0', ' ');
    expect(said).toMatch(/2: 10\.0 g, .*3: 40\.0 g, .*4: 60\.0 g/);
    expect(said).toContain('110.0 g');
    expect(said).toContain('0.10');
    await takeAnswer(page, 'Use this answer');
    for (const [blade, g] of Object.entries(S04.inputs.installed)) {
      await typeWeight(page, 'Record weight in plane B', { ...at, g, position: positionOf(blade) });
      await page.getByRole('row', { name: new RegExp(`${g}.0.g.*correction`) }).waitFor();
    }
    await openAnother(page);
    await typeWeight(page, 'Record weight in plane B', {
      ...at,
      g: 5,
      position: positionOf('blade 4'),
    });
    await page
      .getByText(/its limit is 60 g/)
      .first()
      .waitFor();
    await typeRun(page, 'Record check run', [S04.inputs.check_run]);
    await signJob(page, 'Small remaining miss.');
    expect(errors).toEqual([]);
    await close();
  });
});

/** Positions are labelled by their number. */
const positionOf = (blade: string) => `${blade.replace('blade ', '')},`;

/** Once the plan is fitted the form for a further weight is folded away. */
async function openAnother(page: Page): Promise<void> {
  await page.getByText('Another weight in plane B…').click();
}

/** A rotor with two planes on 700 mm whose answers to a g·mm are known, and what it shows as found. */
const H = [
  [fromPolar(2.1e-4, 40), fromPolar(0.7e-4, 75)],
  [fromPolar(0.6e-4, 20), fromPolar(1.8e-4, 300)],
];
const AS_FOUND = [fromPolar(4.2, 110), fromPolar(3.1, 250)];
type Hung = { plane: number; g: number; deg: number };

/** What both points show with weights at true angles, against rotation; read to 0.01 mm/s and 0.1°. */
function readingsWith(hung: readonly Hung[]) {
  return H.map((row, point) => {
    const effects = hung.map(({ plane, g, deg }) =>
      multiply(row[plane] ?? ZERO, fromPolar(g * 700, deg)),
    );
    const reading = add(AS_FOUND[point] ?? ZERO, sum(effects));
    return { amp: Number(size(reading).toFixed(2)), deg: Number(angleDeg(reading).toFixed(1)) };
  });
}

describe('two planes, degrees counted with rotation and typed as against it', () => {
  it('is found by the slip test after the check run, and put right by newer records', async () => {
    const address = await enteredMachine(browser, {
      tag: 'SW',
      speeds: { lowest: 950, highest: 1010, usual: 990 },
      massKg: 640,
      spanM: 1.9,
      centreM: 0.95,
      planes: [
        { name: 'L', radiusMm: 700, fromAM: 0.4 },
        { name: 'R', radiusMm: 700, fromAM: 1.5 },
      ],
    });
    const { page, errors, close } = await openPage(browser);
    await signInAs(page, 'technician');
    await openJob(page, address, 'Two planes');
    for (const run of [1, 2, 3]) {
      await page.getByRole('heading', { name: `Next: base run ${run}` }).waitFor();
      await typeRun(page, 'Record base run', readingsWith([]));
    }
    await page.getByRole('heading', { name: 'Next: base run 4' }).waitFor();
    await page.getByRole('button', { name: 'Accept the base' }).click();
    for (const [plane, name] of ['L', 'R'].entries()) {
      // Typed 90 against rotation; the weight really hangs at 270.
      await typeWeight(page, `Record trial weight in plane ${name}`, trialAt(90));
      await typeRun(page, 'Record trial run', readingsWith([{ plane, g: 20, deg: 270 }]));
      await settleTrial(page, /taken off/);
    }
    const fitted = await askedOf(page);
    await takeAnswer(page, 'Use this answer');
    for (const [plane, { g, deg }] of fitted.entries())
      await typeWeight(page, `Record weight in plane ${plane === 0 ? 'L' : 'R'}`, {
        ...{ g, deg, radius_mm: 700 },
      });
    // He counts the same way again: each weight hangs at the mirrored place.
    const hung = fitted.map(({ g, deg }, plane) => ({ plane, g, deg: 360 - deg }));
    await typeRun(page, 'Record check run', readingsWith(hung));
    await page.getByRole('heading', { name: /What if we slipped/ }).waitFor();
    await expectAccessible(page);
    const line = page.getByRole('row', { name: /counted with rotation instead of against/ });
    await line.getByRole('button', { name: 'This is what happened…' }).click();
    await page.getByLabel('Who looked, and what was seen?').fill('Ida counted on the photo.');
    await page.getByRole('button', { name: 'Put the records right' }).click();
    await page.getByText('corrects run 6').waitFor();
    const sheet = await textOf(page);
    expect(sheet).not.toContain('What if we slipped');
    expect(sheet).toContain('typed with rotation');
    await trimUntilGood(page, hung);
    expect(errors).toEqual([]);
    await close();
  });
});

const trialAt = (deg: number) => ({ g: 20, radius_mm: 700, deg });

/** With the records right, one trim brings both points below a tenth of the base. */
async function trimUntilGood(page: Page, hung: readonly Hung[]): Promise<void> {
  const more = await askedOf(page);
  await takeAnswer(page, 'Use this trim');
  const added = more.map(({ g, deg }, plane) => ({ plane, g, deg }));
  for (const { plane, g, deg } of added)
    await typeWeight(page, `Record weight in plane ${plane === 0 ? 'L' : 'R'}`, {
      ...{ g, deg, radius_mm: 700 },
    });
  const after = readingsWith([...hung, ...added]);
  for (const { amp } of after) expect(amp).toBeLessThan(0.3);
  await typeRun(page, 'Record check run', after);
  await signJob(page, 'Small remaining miss.');
}
