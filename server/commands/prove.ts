import { readFileSync } from 'node:fs';

import { partsList } from '#shared/lists/parts-list.ts';
import { analyse } from '#shared/rules/analyse.ts';
import { readDesign } from '#shared/files/read-design.ts';

/**
 * `npm run --silent prove -- FILE`: the analysis of a design file as JSON. Exit 0: no must-fix finding is left that
 * is not accepted; 1: some; 2: the file can't be read, with the reason on standard error.
 */
// Whoever reads only the first lines closes the pipe; the exit code still tells what was found.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
});
process.exitCode = prove(process.argv[2]);

function prove(file: string | undefined): number {
  if (file === undefined) return refuse('Name the design file: npm run prove -- FILE.ampwright.json');
  let text: string;
  try {
    text = readFileSync(file, 'utf8');
  } catch (error) {
    return refuse(`${file}: ${error instanceof Error ? error.message : 'cannot be read'}`);
  }
  const read = readDesign(text);
  if (!read.ok) return refuse(`${read.path}: ${read.reason}`);
  const analysis = analyse(read.design, { partsOf: partsList });
  process.stdout.write(`${JSON.stringify(analysis, null, 2)}\n`);
  const isOpen = analysis.findings.some((finding) => finding.severity === 'must' && !finding.accepted);
  return isOpen ? 1 : 0;
}

function refuse(reason: string): number {
  process.stderr.write(`${reason}\n`);
  return 2;
}
