import type { Page } from 'playwright-core';

export type Reading = { amp: number; deg: number };
export type TrialWeight = { g: number; radius_mm: number; deg: number };

const NAME = 'Ida Berg';

/** Signs in and waits for the register's frame. */
export async function signIn(page: Page, base: string, email: string, password: string) {
  await page.goto(`${base}/sign-in`);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

/** Opens a two-plane job from a machine's page address, every choice made by hand. */
export async function openTwoPlaneJob(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.getByLabel(/I looked: mark, tacho and sensors/).check();
  await page.getByLabel('Two planes').check();
  for (const plane of await page.getByLabel(/^Plane /).all()) await plane.check();
  for (const point of await page.getByLabel(/^[AB]-H/).all()) await point.check();
  await page.getByLabel('Why is it balanced?').fill('1x has grown into zone C');
  await page.getByLabel('mm/s rms').check();
  await page.getByLabel(/^lag/).check();
  await page.getByLabel('against rotation').check();
  await page.getByLabel(/Estimate in place/).check();
  await page.getByLabel('I have read this.').check();
  await page.getByRole('button', { name: 'Open balance job' }).click();
  await page.waitForURL(/\/balance-jobs\/\d+$/);
}

/** Types one run: what is confirmed before the start, then size and phase of each point. */
export async function typeRun(page: Page, button: string, readings: readonly Reading[]) {
  const form = page.locator('form').filter({ has: page.getByRole('button', { name: button }) });
  await form.getByLabel('It is so.').check();
  await form.getByLabel('Seen to by (name)').fill(NAME);
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
  await form.getByLabel('Angle from the mark').fill(String(weight.deg));
  await form.getByLabel('against rotation').check();
  await form.getByLabel('Fixed by').fill('clamp with locked screw');
  await form.getByRole('button', { name: button }).click();
}

/** Answers “is it still on the rotor?”, which has no default. */
export async function settleTrial(page: Page, answer: RegExp) {
  await page.getByRole('heading', { name: /is the trial weight still on/ }).waitFor();
  await page.getByLabel(answer).check();
  await page.getByLabel('It stands still and is locked out.').check();
  await page.getByLabel('Locked out by (name)').fill(NAME);
  await page.getByRole('button', { name: 'Record it' }).click();
}
