import { readFileSync } from 'node:fs';

/**
 * When a process started, in ticks since boot; undefined where there is none. Process ids come round again, so a
 * kept id means a process only together with this.
 */
export function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    if (fields[0] === 'Z') return undefined; // ended, only not yet collected by its parent
    return Number(fields[19]);
  } catch {
    return undefined;
  }
}

export function isRunning(kept) {
  return kept !== undefined && startOf(kept.pid) === kept.start;
}
