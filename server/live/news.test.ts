import { eq } from 'drizzle-orm';
import { beforeAll, expect, it } from 'vitest';

import { makeChange } from '#shared/api/design.ts';
import { newId } from '#server/db/ids.ts';
import { session } from '#server/db/schema/accounts.ts';
import { vesselMember } from '#server/db/schema/vessels.ts';
import { aSmallDesign } from '#server/testing/designs.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aMember, aVessel, type TestPerson, type TestVessel } from '#server/testing/people.ts';

let house: TestHouse;
let vessel: TestVessel;
let reader: TestPerson;
let seq = 0;

beforeAll(async () => {
  house = await openHouse();
  vessel = await aVessel(house, { design: aSmallDesign() });
  reader = await aMember(house, vessel, 'reviewer');
});

async function lengthen(lengthM: number, at: TestHouse = house): Promise<void> {
  const body = {
    id: newId(),
    base: seq,
    label: 'Lengthen W1',
    patches: [{ op: 'set', path: ['runs', 'w1', 'lengthM'], value: lengthM }],
  };
  const made = await vessel.admin.at(at).ask(makeChange, { params: { vesselId: vessel.vesselId }, body });
  seq = made.body.seq;
}

async function listen(who: TestPerson, at: TestHouse, headers: Record<string, string> = {}, query = '') {
  const stop = new AbortController();
  const response = await fetch(`${at.address}/api/vessels/${vessel.vesselId}/news${query}`, {
    headers: { cookie: who.cookie, ...headers },
    signal: stop.signal,
  });
  const stream = response.body!.pipeThrough(new TextDecoderStream()).getReader();
  let text = '';
  return {
    type: response.headers.get('content-type'),
    /** What has come once it holds this; fails where the stream ends before. */
    async until(part: string): Promise<string> {
      while (!text.includes(part)) {
        const { done, value } = await stream.read();
        if (done) throw new Error(`the stream ended before ${part}: ${text}`);
        text += value;
      }
      return text;
    },
    /** All of it, once the server has ended it. */
    async untilEnd(): Promise<string> {
      for (;;) {
        const { done, value } = await stream.read();
        if (done) return text;
        text += value;
      }
    },
    leave: () => stop.abort(),
  };
}

it('an edit through one process appears at a reader of another', async () => {
  const other = await house.openAnother();
  const news = await listen(reader, other);
  expect(news.type).toMatch(/^text\/event-stream/);
  await news.until('retry:');
  await lengthen(3.25);
  const told = await news.until('3.25');
  expect(told).toContain(`event: change\nid: ${vessel.vesselId}:${seq}\n`);
  expect(told).toContain(vessel.admin.name);
  news.leave();
  await other.stop();
});

it('a reader who was away hears what was missed, once and in order, from the number it had', async () => {
  const from = seq;
  await lengthen(4.5);
  await lengthen(5.5);
  const since = await listen(reader, house, {}, `?since=${from}`);
  const told = await since.until(`:${from + 2}\n`);
  expect(told.match(/^id: .*$/gm)).toEqual([
    `id: ${vessel.vesselId}:${from + 1}`,
    `id: ${vessel.vesselId}:${from + 2}`,
  ]);
  since.leave();
  const resumed = await listen(reader, house, { 'last-event-id': `${vessel.vesselId}:${from + 1}` }, `?since=${from}`);
  expect((await resumed.until(`:${from + 2}\n`)).match(/^id: .*$/gm)).toEqual([`id: ${vessel.vesselId}:${from + 2}`]);
  resumed.leave();
});

it('whoever is taken off the vessel, or whose session is ended, hears nothing more', async () => {
  const removed = await aMember(house, vessel, 'reviewer');
  const signedOut = await aMember(house, vessel, 'installer');
  const streams = [await listen(removed, house), await listen(signedOut, house)];
  await house.db.delete(vesselMember).where(eq(vesselMember.personId, removed.personId));
  await house.db.delete(session).where(eq(session.userId, signedOut.personId));
  await lengthen(6.75);
  for (const stream of streams) expect(await stream.untilEnd()).not.toContain('6.75');
});

it('a server that is told to stop ends its streams and does not wait for their readers', async () => {
  const other = await house.openAnother();
  const news = await listen(reader, other);
  await news.until('retry:');
  const began = Date.now();
  await other.stop();
  await news.untilEnd();
  expect(Date.now() - began).toBeLessThan(5_000);
});
