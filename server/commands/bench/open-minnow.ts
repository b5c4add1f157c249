import { readFileSync } from 'node:fs';

import type { Browser } from '@playwright/test';

import { importVessel } from '#shared/api/vessels.ts';

import type { Bench } from './bench.ts';
import { MINNOW_FILE } from './minnow.ts';

const SAMPLES = 15;

export const openMinnow: Bench = {
  name: 'open/minnow',
  what: 'navigation to the sheet drawn and checked, signed in, empty cache',
  async measure(place) {
    const { local, designer } = await place.application();
    const browser = await place.browser();
    const file = readFileSync(MINNOW_FILE, 'utf8');
    const { vesselId } = await designer.call(importVessel, { body: { shopId: designer.shopId!, file } });
    const url = `${local.address}/vessels/${vesselId}/draw`;
    await openOnce(browser, url, designer.cookie); // the server's own first time is not the reader's
    const samplesMs: number[] = [];
    for (let taken = 0; taken < SAMPLES; taken += 1) samplesMs.push(await openOnce(browser, url, designer.cookie));
    return { samplesMs };
  },
};

/** Milliseconds from the start of the navigation, by the page's own clock, to the frame that shows all of it. */
async function openOnce(browser: Browser, url: string, cookie: string): Promise<number> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  try {
    const [name = '', ...value] = cookie.split('; ')[0]!.split('=');
    await context.addCookies([{ name, value: value.join('='), url: new URL(url).origin }]);
    const page = await context.newPage();
    await page.goto(url, { waitUntil: 'commit' });
    const shown = await page.waitForFunction(
      () => {
        const isDrawn = document.querySelectorAll('[aria-label="Sheet"] .react-flow__node').length > 0;
        const isChecked = document.querySelector('.strip')?.textContent?.includes('Checked as you draw') ?? false;
        return isDrawn && isChecked ? performance.now() : false;
      },
      undefined,
      { polling: 'raf', timeout: 60_000 },
    );
    return (await shown.jsonValue()) as number;
  } finally {
    await context.close();
  }
}
