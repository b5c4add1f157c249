import { endRunning } from './run.mjs';
import { endWith } from './stopped.mjs';

/**
 * Collects what is to be stopped and stops it, last started first, once: on Ctrl-C, on a request to end, when the
 * terminal closes, or when the command is done. A second Ctrl-C does not cut the stopping short.
 */
export function collectStops() {
  const stops = [];
  let stopping;
  const stopAll = () => {
    stopping ??= (async () => {
      endRunning();
      for (const stop of stops.toReversed()) await stop();
    })();
    return stopping;
  };
  let cleanCode = 130;
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      stopAll().then(() => process.exit(cleanCode), endWith);
    });
  }
  return {
    add: (stop) => stops.push(stop),
    stopAll,
    isStopping: () => stopping !== undefined,
    /** From here on being told to end is the way it ends: exit code 0. */
    expectToBeEnded: () => (cleanCode = 0),
  };
}
