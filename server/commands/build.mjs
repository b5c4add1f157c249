/** Builds the client into `dist/` if what it is made from has changed; what `npm start` and the tests serve. */
import { buildClient } from './client.mjs';
import { whileAlone } from './own-folder.mjs';
import { ROOT } from './run.mjs';
import { endWith } from './stopped.mjs';

await whileAlone(ROOT, () => buildClient(console.log)).catch(endWith);
