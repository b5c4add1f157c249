/** `npm start`: sets up whatever is missing, then serves the application until it is told to end. */
import { buildClient } from './client.mjs';
import { printWelcome } from './welcome.mjs';
import { lastLines, startServer } from './local-server.mjs';
import { setUp } from './set-up.mjs';
import { readStartSettings } from './settings.mjs';
import { collectStops } from './stop-signals.mjs';
import { endWith, Stopped } from './stopped.mjs';

const say = (line) => console.log(line);
const stops = collectStops();

try {
  const settings = readStartSettings();
  const { env, database, dataFolder, demoFolder } = await setUp({
    settings,
    say,
    stops,
    alsoWhileAlone: () => buildClient(say),
  });
  const server = startServer({ env, port: settings.port, host: settings.host, dataFolder });
  stops.add(server.stop);
  await server.ready;
  stops.expectToBeEnded();
  printWelcome({ settings, database, demoFolder, dataFolder });

  const code = await server.ended;
  if (!stops.isStopping()) throw new Stopped(`The server ended by itself (${code}).\n${lastLines(server.log)}`);
} catch (error) {
  if (!stops.isStopping()) {
    await stops.stopAll().catch(console.error);
    endWith(error);
  }
}
