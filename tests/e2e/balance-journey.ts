import type { Locator, Page } from 'playwright-core';
import { expectAccessible, textOf } from '@/tests/support/browser-page';

export type Reading = { amp: number; deg: number };
/** Where a weight hangs: degrees against rotation, or a position by its label. */
export type TrialWeight = { g: number; radius_mm: number; photo?: ChosenFile } & (
  { deg: number } | { position: string }
);
type ChosenFile = { name: string; mimeType: string; buffer: Buffer };

const NAME = 'Ida Berg';

/** Signs in and waits for the register's frame. */
export async function signIn(page: Page, base: string, email: string, password: string) {
  await page.goto(`${base}/sign-in`);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

/** Opens a job from a machine's page address, every choice made by hand: every plane, points read across. */
export async function openJob(page: Page, address: string, kind: 'One plane' | 'Two planes') {
  await page.goto(`${address}/new-balance-job`);
  await page.getByLabel(/I looked: mark, tacho and sensors/).check();
  const named = kind === 'One plane' ? kind : 'Two planes the usual rotor';
  await page.getByRole('radio', { name: named }).check();
  for (const plane of await page.getByLabel(/^Plane /).all()) await plane.check();
  const points = page.getByLabel(kind === 'One plane' ? /^A-H/ : /^[AB]-H/);
  for (const point of await points.all()) await point.check();
  await page.getByLabel('Why is it balanced?').fill('1x has grown into zone C');
  await page.getByLabel('yes', { exact: true }).check();
  for (const tick of [/nothing is loose/, /tacho counts steadily/, /agreed with the area owner/])
    await page.getByLabel(tick).check();
  await page.getByLabel('mm/s rms').check();
  await page.getByLabel(/^lag/).check();
  await page.getByLabel('against rotation').check();
  await page.getByLabel(/Estimate in place/).check();
  await page.getByLabel('I have read this.').check();
  await page.getByRole('button', { name: 'Open balance job' }).click();
  await page.waitForURL(/\/balance-jobs\/\d+$/);
}

/** Types one run: what is confirmed before the start, then size and phase of each point. */
export async function typeRun(
  page: Page,
  button: string,
  readings: readonly Reading[],
  speedRpm?: number,
) {
  const form = page.locator('form').filter({ has: page.getByRole('button', { name: button }) });
  await form.getByLabel('It is so.').check();
  await form.getByLabel('Seen to by (name)').fill(NAME);
  if (speedRpm !== undefined) await form.getByLabel('Speed').fill(String(speedRpm));
  for (const [index, reading] of readings.entries()) {
    await form.locator(`[name="vectors.${index}.amplitude"]`).fill(String(reading.amp));
    await form.locator(`[name="vectors.${index}.phaseDeg"]`).fill(String(reading.deg));
  }
  await form.getByRole('button', { name: button }).click();
}

/** Records a weight where it really hangs. */
export async function typeWeight(page: Page, button: string, weight: TrialWeight) {
  const form = page.locator('form').filter({ has: page.getByRole('button', { name: button }) });
  await form.getByLabel('It stands still and is locked out.').check();
  await form.getByLabel('Locked out by (name)').fill(NAME);
  await form.getByLabel('Mass, force and fixing are checked.').check();
  await form.getByLabel(/Mass that hangs there now/).fill(String(weight.g));
  await form.getByLabel('Radius to its centre of mass').fill(String(weight.radius_mm));
  await form.getByLabel('weighed on a scale').check();
  await typePlace(form, weight);
  await form.getByLabel('How it is held').selectOption('temporary');
  await form.getByLabel('Fixed by').fill('clamp with locked screw');
  if (weight.photo) await form.getByLabel(/^Photo of the weight/).setInputFiles(weight.photo);
  else await form.getByLabel('or no photo, because').selectOption('later');
  await form.getByRole('button', { name: button }).click();
}

async function typePlace(form: Locator, weight: TrialWeight) {
  if ('position' in weight) {
    const option = form.getByRole('option', { name: weight.position });
    const value = (await option.getAttribute('value')) ?? '';
    await form.getByLabel('Position').selectOption(value);
    return;
  }
  await form.getByLabel('Angle from the mark').fill(String(weight.deg));
  await form.getByLabel('against rotation').check();
}

/** Puts a weight on the ledger that hangs on the rotor and is not listed. */
export async function typeFound(page: Page, weight: TrialWeight) {
  await page.getByRole('button', { name: 'Found one that is not listed…' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Mass, weighed or estimated').fill(String(weight.g));
  await dialog.getByLabel('Radius to its centre of mass').fill(String(weight.radius_mm));
  await typePlace(dialog, weight);
  await dialog.getByLabel('Fixed by').fill('bolt');
  await dialog.getByLabel('It stands still and is locked out.').check();
  await dialog.getByLabel('Locked out by (name)').fill(NAME);
  await dialog.getByRole('button', { name: 'Put it on the ledger' }).click();
  await dialog.getByText('Saved').waitFor();
  await page.keyboard.press('Escape');
  await dialog.waitFor({ state: 'detached' });
}

/** Answers “is it still on the rotor?”, which has no default. */
export async function settleTrial(page: Page, answer: RegExp) {
  await page.getByRole('heading', { name: /is the trial weight still on/ }).waitFor();
  await page.getByLabel(answer).check();
  await page.getByLabel('It stands still and is locked out.').check();
  await page.getByLabel('Locked out by (name)').fill(NAME);
  await page.getByRole('button', { name: 'Record it' }).click();
}

/** Makes every weight permanent, hands the machine back, and signs. */
export async function signJob(page: Page, why: string): Promise<void> {
  const sign = page.getByRole('button', { name: 'Sign the job record' });
  await sign.waitFor();
  for (const permanent of await page.getByLabel(/is permanent/).all()) await permanent.check();
  const form = page.locator('form').filter({ has: sign });
  await form.getByLabel('It is so.').check();
  await form.getByLabel(/Area owner/).fill('Rune Holt');
  await form.getByLabel(/Why it is signed although/).fill(why);
  await sign.click();
  await sign.waitFor({ state: 'detached' });
}

/** Goes on with the base runs as they are. */
export async function acceptBase(page: Page, why: string): Promise<void> {
  await page.getByLabel(/Why you go on/).fill(why);
  await page.getByRole('button', { name: 'Accept the base' }).click();
}

/** What the page says once the button of the answer stands there; then uses the answer. */
export async function takeAnswer(page: Page, name: string): Promise<string> {
  const use = page.getByRole('button', { name });
  await use.waitFor();
  await expectAccessible(page);
  const said = await textOf(page);
  await use.click();
  return said;
}

/** The grams and degrees against rotation that the answer card asks for, plane by plane. */
export async function askedOf(page: Page): Promise<{ g: number; deg: number }[]> {
  const card = page.getByRole('table', { name: 'Add to what is on the rotor now' });
  await card.waitFor();
  const heads = await card.getByRole('columnheader').allInnerTexts();
  const [mass, angle] = ['add', 'at, against rotation'].map((name) => heads.indexOf(name) - 1);
  const rows = await card.locator('tbody tr').all();
  return Promise.all(
    rows.map(async (row) => {
      const cells = await row.locator('td').allInnerTexts();
      return { g: parseFloat(cells[mass ?? 0] ?? ''), deg: parseFloat(cells[angle ?? 0] ?? '') };
    }),
  );
}
