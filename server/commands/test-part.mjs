import { spawn } from 'node:child_process';

import { ROOT } from './run.mjs';

const running = new Set();

/** Runs one part to its end or its limit, shows what it said, and answers its counts. */
export async function runPart(part, env) {
  console.log(`… ${part.title}`);
  const began = Date.now();
  const end = await runLimited(part, env);
  const counts = part.count(end);
  const seconds = ((Date.now() - began) / 1000).toFixed(1);
  const verdict = counts.failed === 0 ? '✓' : '✗';
  const said = end.said.trim();
  console.log(`${verdict} ${part.title}: ${counts.passed} passed, ${counts.failed} failed, ${seconds} s`);
  if (said !== '') console.log(said.replace(/^/gm, '    '));
  return counts;
}

function runLimited(part, env) {
  return new Promise((done) => {
    const [command, ...args] = part.command;
    // A group of its own, so that at the limit nothing it started is left behind.
    const child = spawn(command, args, {
      cwd: ROOT,
      env: { ...env, FORCE_COLOR: '0', NO_COLOR: '1', ...part.env },
      detached: true,
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    running.add(child);
    let said = '';
    let late = false;
    child.stdout.on('data', (data) => (said += data));
    child.stderr.on('data', (data) => (said += data));
    const limit = setTimeout(() => {
      late = true;
      endGroup(child, 'SIGTERM');
      setTimeout(() => running.has(child) && endGroup(child, 'SIGKILL'), 15_000).unref();
    }, part.limitS * 1000);
    const finish = (code, signal) => {
      clearTimeout(limit);
      running.delete(child);
      if (late) said += `\nended: it took more than ${part.limitS} s`;
      else if (signal) said += `\nended by ${signal}`;
      done({ code: code ?? -1, said });
    };
    child.once('error', (error) => {
      said += error.message;
      finish(-1);
    });
    child.once('close', finish);
  });
}

/** Ends the parts that still run, with all they started. */
export function endParts() {
  for (const child of running) endGroup(child, 'SIGTERM');
}

function endGroup(child, signal) {
  try {
    process.kill(-child.pid, signal);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}
