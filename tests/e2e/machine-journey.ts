import type { Browser, Page } from 'playwright-core';
import { routes } from '@/lib/routes';
import { openPage } from '@/tests/support/browser-page';
import { baseUrl } from '@/tests/support/chromium';
import { signInAs } from './people';

export type TypedMachine = {
  tag: string;
  speeds: { lowest: number; highest: number; usual: number };
  massKg: number;
  spanM: number;
  centreM: number;
  planes: readonly {
    name: string;
    radiusMm: number;
    fromAM: number;
    fixed?: { positions: number; firstDeg: number; maxG: number; pieceG: number };
  }[];
  grade?: number;
};

/** A machine of its own, entered by an engineer; the address of its page. */
export async function enteredMachine(browser: Browser, machine: TypedMachine): Promise<string> {
  const { page, close } = await openPage(browser);
  await signInAs(page, 'engineer');
  const tag = `${machine.tag}-${Date.now() % 1_000_000}`;
  const address = await enterMachine(page, { ...machine, tag });
  await close();
  return address;
}

/** Enters a fan between bearings through its form and waits for its page; the address of that page. */
export async function enterMachine(page: Page, machine: TypedMachine): Promise<string> {
  await page.goto(baseUrl() + routes.newMachine());
  await page.getByLabel('Tag', { exact: true }).fill(machine.tag);
  await page.getByLabel('Name', { exact: true }).first().fill('Kiln exhaust fan');
  await page.getByLabel('Kind').selectOption('fan between bearings');
  await page.getByLabel('Area').fill('Kiln line');
  await page.getByLabel('Power').fill('250');
  await page.getByLabel('Lowest speed').fill(String(machine.speeds.lowest));
  await page.getByLabel('Highest speed').fill(String(machine.speeds.highest));
  await page.getByLabel('Usual speed').fill(String(machine.speeds.usual));
  await page.getByLabel('B, stops a line').check();
  await page.getByLabel('rigid', { exact: true }).check();
  await typeRotor(page, machine);
  await page.getByLabel('The mark: angle zero').fill('Punch mark on the hub');
  await page.getByLabel('Tacho, from top').fill('0');
  await page.getByLabel('rising').check();
  await page.getByLabel('clockwise', { exact: true }).check();
  await page.getByLabel('Limit set').selectOption({ index: 1 });
  await page.getByRole('button', { name: 'Enter machine' }).click();
  await page.waitForURL(/\/machines\/\d+$/);
  return page.url();
}

async function typeRotor(
  page: Page,
  { tag, massKg, spanM, centreM, planes, grade = 6.3 }: TypedMachine,
) {
  await page.getByLabel('Serial number').fill(`${tag}-R1`);
  await page.getByLabel('Mass', { exact: true }).fill(String(massKg));
  await page.getByLabel('Balance quality grade G').fill(String(grade));
  await page.getByLabel('Distance between bearings').fill(String(spanM));
  await page.getByLabel('Centre of mass, from bearing A').fill(String(centreM));
  await page.locator('[name="bearings.0.fromAM"]').fill('0');
  await page.locator('[name="bearings.1.fromAM"]').fill(String(spanM));
  for (const [index, plane] of planes.entries()) {
    if (index > 0) await page.getByRole('button', { name: 'Add a plane' }).click();
    await page.locator(`[name="planes.${index}.name"]`).fill(plane.name);
    await page.locator(`[name="planes.${index}.radiusMm"]`).fill(String(plane.radiusMm));
    await page.locator(`[name="planes.${index}.fromAM"]`).fill(String(plane.fromAM));
    if (plane.fixed) await typePositions(page, index, plane.fixed);
  }
}

type Fixed = NonNullable<TypedMachine['planes'][number]['fixed']>;

/** Positions numbered against rotation. */
async function typePositions(page: Page, index: number, fixed: Fixed) {
  const at = (name: string) => page.locator(`[name="planes.${index}.${name}"]`);
  await at('positions').fill(String(fixed.positions));
  await at('numbering').selectOption('against');
  await at('firstDeg').fill(String(fixed.firstDeg));
  await at('positionMaxG').fill(String(fixed.maxG));
  await at('pieceG').fill(String(fixed.pieceG));
}
