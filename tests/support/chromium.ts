import { chromium, type Browser } from 'playwright-core';
import { CHROMIUM } from '../../scripts/lib/chromium.mjs';

/** The system's Chromium without a window; it fetches nothing of its own accord. */
export function openChromium(): Promise<Browser> {
  return chromium.launch({ executablePath: CHROMIUM, args: QUIET });
}

/** The address of the product under test. */
export function baseUrl(): string {
  const url = process.env.EVENRUN_BASE_URL;
  if (url) return url;
  throw new Error('EVENRUN_BASE_URL is not set: run these tests as vitest’s project “browser”.');
}

const QUIET = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--disable-dev-shm-usage',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];
