import { existsSync } from 'node:fs';
import { chromium, type Browser } from 'playwright-core';

/** Where Debian and its kin put it. */
const PLACES = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/** A real browser; a missing one fails, it never skips. */
export async function openBrowser(): Promise<Browser> {
  const executablePath = process.env['CHROMIUM'] ?? PLACES.find((place) => existsSync(place));
  if (executablePath === undefined) throw new Error(`no browser at ${PLACES.join(', ')}: install chromium, or say where it is in CHROMIUM`);
  return chromium.launch({ executablePath, args: ['--no-sandbox'] });
}
