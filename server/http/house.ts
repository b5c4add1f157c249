import type { Request } from 'express';
import type { Logger } from 'pino';

import type { OpenDatabase } from '#server/db/connect.ts';
import type { NewsDesk } from '#server/live/news-desk.ts';
import type { Mailbox } from '#server/mail/mailbox.ts';

import type { Configuration } from './configuration.ts';
import type { SignIn } from './sign-in.ts';

/** What a handler may reach for. One a process; two may stand side by side in a test. */
export interface House {
  readonly db: OpenDatabase;
  readonly configuration: Configuration;
  readonly signIn: SignIn;
  readonly news: NewsDesk;
  readonly log: Logger;
  /** Only where this process or one beside it takes its own mail in. */
  readonly mailbox: Mailbox | undefined;
}

export function houseOf(request: Request): House {
  return request.app.locals['house'] as House;
}
