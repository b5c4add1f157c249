import { mkdtempSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { defineConfig } from '@playwright/test';

// Chosen once by the first process that reads this file; the workers inherit it.
process.env['E2E_PORT'] ??= String(await freePort());
process.env['E2E_RUNNER'] ??= String(process.pid);
process.env['E2E_FOLDER'] ??= mkdtempSync(join(tmpdir(), 'ampwright-e2e-'));
const address = `http://127.0.0.1:${process.env['E2E_PORT']}`;

export default defineConfig({
  testDir: './journeys',
  outputDir: '../test-results',
  fullyParallel: true,
  forbidOnly: process.env['CI'] !== undefined,
  retries: 0,
  workers: 2,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    baseURL: address,
    viewport: { width: 1440, height: 900 },
    locale: 'en-US',
    timezoneId: 'UTC',
    reducedMotion: 'reduce',
    actionTimeout: 15_000,
    navigationTimeout: 20_000,
    screenshot: 'only-on-failure',
    // A trace takes a picture of the page at every step, which a drawing makes dear.
    trace: process.env['E2E_TRACE'] === undefined ? 'off' : 'retain-on-failure',
    launchOptions: {
      executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium',
      args: [
        '--no-sandbox', // as root, in a container
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
  // With E2E_RUNNING the journeys are run against a server that stands already, started by fixtures/serve.mjs.
  webServer:
    process.env['E2E_RUNNING'] !== undefined
      ? undefined
      : {
          command: 'node e2e/fixtures/serve.mjs',
          cwd: '..',
          url: `${address}/api/server`,
          timeout: 120_000,
          reuseExistingServer: false,
          stdout: 'ignore',
          stderr: 'pipe',
          gracefulShutdown: { signal: 'SIGTERM', timeout: 20_000 },
        },
});

function freePort(): Promise<number> {
  return new Promise((done, refuse) => {
    const server = createServer();
    server.once('error', refuse);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      const port = typeof address === 'object' && address !== null ? address.port : 0;
      server.close(() => done(port));
    });
  });
}
