import { createServer, type Server } from 'node:http';

import type { RequestHandler } from 'express';
import { pino, type Logger } from 'pino';

import { createApp } from './app.ts';
import { closeDatabase, openDatabase } from './db/connect.ts';
import type { Configuration } from './http/configuration.ts';
import type { House } from './http/house.ts';
import { openSignIn } from './http/sign-in.ts';
import { openNewsDesk } from './live/news-desk.ts';
import { openMailbox, startMailIntake } from './mail/mailbox.ts';
import { openMailer } from './mail/mailer.ts';
import { startMailWorker } from './mail/outbox.ts';
import { startClearing } from './services/clear-deleted-vessels.ts';

export interface RunningHouse {
  readonly house: House;
  readonly server: Server;
  stop(): Promise<void>;
}

/** Everything a process runs, on a server that listens or soon will. Stopping it leaves nothing behind. */
export async function startHouse(
  configuration: Configuration,
  options: { readonly client?: RequestHandler; readonly log?: Logger } = {},
): Promise<RunningHouse> {
  const log = options.log ?? pino({ level: configuration.logLevel });
  const db = openDatabase(configuration.databaseUrl);
  const news = openNewsDesk(db, log);
  const intake = configuration.mailbox === undefined ? undefined : await startMailIntake(configuration.mailbox);
  const smtpUrl = configuration.smtpUrl ?? intake?.smtpUrl;
  const house: House = {
    db,
    configuration,
    signIn: openSignIn(db, configuration, log),
    news,
    log,
    mailbox: configuration.mailbox === undefined ? undefined : openMailbox(configuration.mailbox),
  };
  const worker =
    smtpUrl === undefined ? undefined : startMailWorker(db, openMailer(smtpUrl, configuration.mailFrom), log);
  if (worker === undefined) log.warn('SMTP_URL is not set: mails stay in the outbox');
  const clearing = startClearing(db, log);

  const server = createServer(createApp(house, options.client));
  server.requestTimeout = 60_000;
  server.headersTimeout = 20_000;
  server.keepAliveTimeout = 10_000;

  return {
    house,
    server,
    async stop() {
      news.close();
      await closeServer(server);
      clearing.stop();
      await worker?.stop();
      await intake?.stop();
      await closeDatabase(db);
    },
  };
}

/** Waits for answers under way, then ends what is still open. */
function closeServer(server: Server): Promise<void> {
  if (!server.listening) return Promise.resolve();
  return new Promise((resolve) => {
    const timer = setTimeout(() => server.closeAllConnections(), 2_000);
    server.close(() => {
      clearTimeout(timer);
      resolve();
    });
    server.closeIdleConnections();
  });
}
