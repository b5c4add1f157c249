import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterAll, beforeAll, expect, test } from 'vitest';

import { createVessel } from '#shared/api/vessels.ts';
import { getDesign, listChanges, makeChange, type Change, type LoggedChange } from '#shared/api/design.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';

import { startLocalAmpwright, type LocalAmpwright } from './local-ampwright.ts';
import { signUp } from './person.ts';
import { seededRandom } from './seeded-random.ts';

const KILLS = 20;
const EDITORS = 4;
/** The database more often than the server, which takes ten times as long to be back. */
const VICTIMS = ['server', 'database', 'database', 'both'] as const;
const SEED = 20_260_114;

let folder: string;
let local: LocalAmpwright;

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'ampwright-kill-'));
  local = await startLocalAmpwright(folder);
}, 120_000);

afterAll(async () => {
  await local?.stop();
  rmSync(folder, { recursive: true, force: true });
}, 60_000);

test(`server, database or both die ${KILLS} times amid edits: nothing acknowledged is lost, nothing is applied twice`, async () => {
  console.log(`seed ${SEED}`);
  const random = seededRandom(SEED);
  const designer = await signUp(local.address, {
    name: 'Ledger Keeper',
    email: 'ledger@kill.example',
    password: 'tide-table-forty-two',
  });
  const vessel = await designer.call(createVessel, { body: { shopId: designer.shopId!, name: 'Kill trial' } });
  const params = { vesselId: vessel.vesselId };
  const first = await designer.call(getDesign, { params });
  const sheetId = Object.keys(first.design.sheets)[0]!;

  // The ledger stands outside of the product: what was asked for, and the number each was acknowledged with.
  const ledger = new Map<string, { readonly change: Change; readonly seq: number }>();
  let isOver = false;
  let refusals = 0;
  let onAcknowledged = (): void => {};

  const editors = Array.from({ length: EDITORS }, async (_, editor) => {
    for (let edit = 0; !isOver; edit += 1) {
      const change = nextChange(editor, edit, sheetId, first.seq);
      for (let isAcknowledged = false; !isAcknowledged;) {
        const seq = await askFor(change);
        if (seq === undefined) {
          refusals += 1;
          await local.whenUp(); // then once more, with the same id: it may have been kept, only the answer lost
          continue;
        }
        ledger.set(change.id, { change, seq });
        isAcknowledged = true;
        onAcknowledged();
      }
    }
  });
  function acknowledged(count: number): Promise<void> {
    const enough = ledger.size + count;
    return new Promise((done) => {
      onAcknowledged = () => {
        if (ledger.size >= enough) done();
      };
    });
  }
  async function askFor(change: Change): Promise<number | undefined> {
    const reply = await designer.tryCall(makeChange, { params, body: change });
    return reply?.seq;
  }

  for (let kill = 0; kill < KILLS; kill += 1) {
    const victims = VICTIMS[random.whole(VICTIMS.length)]!;
    await acknowledged(1 + random.whole(15)); // so that each death falls amid edits, however slow the machine
    await pause(random.whole(25));
    await local.kill(victims);
    await local.startAgain();
  }
  isOver = true;
  await Promise.all(editors);

  const log = await readLog();
  const last = await designer.call(getDesign, { params });
  console.log(`${ledger.size} changes acknowledged, ${refusals} sent again, ${log.length} in the log`);

  expect(refusals, 'changes whose answer was lost').toBeGreaterThan(KILLS / 2);
  // Every acknowledged change is there exactly once, under the number that was told, and there are no others.
  expect(log.map((change) => change.id).toSorted()).toEqual([...ledger.keys()].toSorted());
  for (const change of log) expect(change.seq).toBe(ledger.get(change.id)?.seq);
  for (const change of log) expect(change.patches).toEqual(ledger.get(change.id)?.change.patches);
  // No gap, no number twice.
  expect(log.map((change) => change.seq)).toEqual(log.map((_, index) => first.seq + 1 + index));
  // The rows say what the log says.
  const replayed = log.reduce<Design>((design, change) => applyPatches(design, change.patches), first.design);
  expect(last.design).toEqual(replayed);
  expect(last.seq).toBe(first.seq + log.length);

  async function readLog(): Promise<LoggedChange[]> {
    const whole: LoggedChange[] = [];
    for (let since = first.seq; ;) {
      const page = await designer.call(listChanges, { params, query: { since } });
      whole.push(...page.changes);
      if (!page.more) return whole;
      since = page.changes.at(-1)!.seq;
    }
  }
}, 300_000);

function pause(milliseconds: number): Promise<void> {
  return new Promise((done) => setTimeout(done, milliseconds));
}

/** Each editor places devices of its own and moves them about; one in seven is taken away again. */
function nextChange(editor: number, edit: number, sheetId: string, base: number): Change {
  const round = Math.floor(edit / 3);
  const id = `d-${editor}-${round}`;
  const device = { id, kind: 'busbar', mark: `X${editor}${round}`, ratings: { ratedA: 150 }, sheetId, x: 160, y: 160 };
  const steps: readonly Pick<Change, 'label' | 'patches'>[] = [
    { label: 'Place a busbar', patches: [{ op: 'set', path: ['devices', id], value: device }] },
    { label: 'Move a busbar', patches: [{ op: 'set', path: ['devices', id, 'x'], value: 160 + 8 * (edit % 50) }] },
    round % 7 === 6
      ? { label: 'Take a busbar away', patches: [{ op: 'remove', path: ['devices', id] }] }
      : {
          label: 'Rate a busbar',
          patches: [{ op: 'set', path: ['devices', id, 'ratings', 'ratedA'], value: 100 + edit }],
        },
  ];
  return { id: crypto.randomUUID(), base, ...steps[edit % 3]! };
}
