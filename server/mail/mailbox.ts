import { mkdir, readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';

import { SMTPServer } from 'smtp-server';

import { newId } from '#server/db/ids.ts';

/** The stand-in for a mail service on one's own machine: takes mail in on loopback and keeps it as files to be read. */
export interface Mailbox {
  list(): Promise<KeptMail[]>;
}

export interface KeptMail {
  readonly mailId: string;
  readonly to: string;
  readonly from: string;
  readonly subject: string;
  readonly at: string;
  readonly text: string;
  readonly links: readonly string[];
}

const MOST_KEPT = 200;

export function openMailbox(folder: string): Mailbox {
  return {
    async list() {
      const names = (await namesIn(folder)).toReversed();
      return Promise.all(names.map(async (name) => JSON.parse(await readFile(join(folder, name), 'utf8')) as KeptMail));
    },
  };
}

/** Listens on a free port of loopback; `smtpUrl` is where to send. */
export async function startMailIntake(folder: string): Promise<{ smtpUrl: string; stop(): Promise<void> }> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    size: 1_000_000,
    onData(stream, _session, callback) {
      // Loaded with the first mail: loading it is a good part of a start.
      import('mailparser')
        .then(({ simpleParser }) => simpleParser(stream))
        .then(async (mail) => {
          const to = Array.isArray(mail.to) ? mail.to[0] : mail.to;
          const text = mail.text ?? '';
          await keep(folder, {
            mailId: newId(),
            to: to?.text ?? '',
            from: mail.from?.text ?? '',
            subject: mail.subject ?? '',
            at: new Date().toISOString(),
            text,
            links: text.match(/https?:\/\/[^\s<>"]+/g) ?? [],
          });
          callback();
        })
        .catch((error: unknown) => callback(error instanceof Error ? error : new Error(String(error))));
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

/** Ids sort by time, so the oldest files are the first; only so many are kept. */
async function keep(folder: string, mail: KeptMail): Promise<void> {
  const file = join(folder, `${mail.mailId}.json`);
  await writeFile(`${file}.new`, JSON.stringify(mail), { mode: 0o600 });
  await rename(`${file}.new`, file);
  const names = await namesIn(folder);
  await Promise.all(names.slice(0, -MOST_KEPT).map((name) => rm(join(folder, name), { force: true })));
}

async function namesIn(folder: string): Promise<string[]> {
  const names = await readdir(folder).catch(() => []);
  return names.filter((name) => name.endsWith('.json')).sort();
}
