import { spawn } from 'node:child_process';
import { join, resolve } from 'node:path';

import { Stopped } from './stopped.mjs';

export const ROOT = resolve(import.meta.dirname, '../..');

const running = new Set();

/** Runs a program to its end. Answers its exit code and what it said; says nothing itself. */
export function runQuietly(command, args, { cwd = ROOT, env = process.env, withParent = false } = {}) {
  return new Promise((done) => {
    const stdio = ['ignore', 'pipe', 'pipe', ...(withParent ? ['ipc'] : [])];
    const child = spawn(command, args, { cwd, env, stdio });
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

/** Runs one of our TypeScript commands, which ends when this one dies: else it would write on behind the next start. */
export function runTypeScript(sentence, file, args, env) {
  // Before all else, so that it hears of a parent that dies while the rest is being loaded.
  const nodeArgs = ['--import', join(import.meta.dirname, 'with-parent.mjs'), '--import', 'tsx'];
  return runOrStop(sentence, process.execPath, [...nodeArgs, file, ...args], {
    env: { ...process.env, ...env },
    withParent: true,
  });
}

/** Ends whatever `runQuietly` has running. */
export function endRunning() {
  for (const child of running) child.kill('SIGTERM');
}
