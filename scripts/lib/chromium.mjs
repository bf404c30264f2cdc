import { existsSync } from 'node:fs';
import { aptInstall } from './apt.mjs';

export const CHROMIUM = '/usr/bin/chromium';

/** Installs the browser that the browser suite drives, where it is missing. */
export async function ensureChromium() {
  if (!existsSync(CHROMIUM)) await aptInstall(['chromium'], 'Chromium');
}
