import { spawn } from 'node:child_process';
import { resolve } from 'node:path';

import { Stopped } from './stopped.mjs';

export const ROOT = resolve(import.meta.dirname, '../..');

const running = new Set();

/** Runs a program to its end. Answers its exit code and what it said; says nothing itself. */
export function runQuietly(command, args, { cwd = ROOT, env = process.env } = {}) {
  return new Promise((done) => {
    const child = spawn(command, args, { cwd, env, stdio: ['ignore', 'pipe', 'pipe'] });
    running.add(child);
    let said = '';
    child.stdout.on('data', (data) => (said += data));
    child.stderr.on('data', (data) => (said += data));
    child.once('error', (error) => done({ code: -1, said: `${said}${error.message}` }));
    child.once('close', (code, signal) => {
      running.delete(child);
      done({ code: code ?? -1, said: signal === null ? said : `${said}\nended by ${signal}` });
    });
  });
}

/** The same, where failing ends the command: with the sentence, and the end of what the program said. */
export async function runOrStop(sentence, command, args, options) {
  const { code, said } = await runQuietly(command, args, options);
  if (code === 0) return said;
  if (/ENOSPC|No space left on device/.test(said)) {
    throw new Stopped(`The disk is full: ${sentence} Free some space and start again.`);
  }
  throw new Stopped(`${sentence}\n${shorten(said)}`);
}

/** The beginning, where a compiler says what is wrong, and the end, where a package manager does. */
function shorten(said) {
  const lines = said.trim().split('\n');
  return (lines.length <= 24 ? lines : [...lines.slice(0, 12), '…', ...lines.slice(-12)]).join('\n');
}

/** Runs one of our TypeScript commands. */
export function runTypeScript(sentence, file, args, env) {
  return runOrStop(sentence, process.execPath, ['--import', 'tsx', file, ...args], { env: { ...process.env, ...env } });
}

/** Ends whatever `runQuietly` has running. */
export function endRunning() {
  for (const child of running) child.kill('SIGTERM');
}
