import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { chromium, type Browser } from '@playwright/test';

import { startLocalAmpwright, type LocalAmpwright } from '#server/commands/local-ampwright.ts';
import { signUp, type Person } from '#server/commands/person.ts';

/** What benches need of the world, made when the first of them asks and shared by all. */
export interface BenchPlace {
  /** A running application over a durable database, and a designer who is signed in. */
  application(): Promise<{ readonly local: LocalAmpwright; readonly designer: Person }>;
  browser(): Promise<Browser>;
  close(): Promise<void>;
}

export function openBenchPlace(): BenchPlace {
  const folder = mkdtempSync(join(tmpdir(), 'ampwright-bench-'));
  let application: Promise<{ readonly local: LocalAmpwright; readonly designer: Person }> | undefined;
  let browser: Promise<Browser> | undefined;
  return {
    application: () => (application ??= startApplication(folder)),
    browser: () => (browser ??= startBrowser()),
    async close() {
      await (await browser)?.close();
      await (await application)?.local.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

async function startApplication(
  folder: string,
): Promise<{ readonly local: LocalAmpwright; readonly designer: Person }> {
  const local = await startLocalAmpwright(folder);
  const designer = await signUp(local.address, {
    name: 'Bench Hand',
    email: 'hand@bench.example',
    password: 'stop-watch-and-ledger',
  });
  return { local, designer };
}

function startBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}
