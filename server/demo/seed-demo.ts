import { randomBytes } from 'node:crypto';
import { mkdir, readFile, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

import { readDesign } from '#shared/files/read-design.ts';
import type { Design } from '#shared/model/design.ts';
import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { credential, person } from '#server/db/schema/accounts.ts';
import { shop, shopMember } from '#server/db/schema/shops.ts';
import { vesselMember } from '#server/db/schema/vessels.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { hashPassword } from '#server/http/sign-in.ts';
import { insertVessel } from '#server/services/add-vessel.ts';
import { insertRevision } from '#server/services/issue-revision.ts';

import { DEMO_PEOPLE, DEMO_SHOP, type DemoPerson } from './demo-people.ts';

export type DemoSignIn = Pick<DemoPerson, 'name' | 'email' | 'role' | 'admin'> & { readonly password: string };

/**
 * The invented shop, its people and its vessels, into a database in which nobody is yet; into any other nothing.
 * The passwords are made here and kept in `sign-ins.json` of the folder, which only its owner may read.
 */
export async function seedDemo(
  db: OpenDatabase,
  { folder }: { readonly folder: string },
): Promise<{ readonly seeded: boolean; readonly signIns: readonly DemoSignIn[] }> {
  if (!(await isEmpty(db))) return { seeded: false, signIns: [] };
  const signIns = DEMO_PEOPLE.map((one) => ({ ...one, password: randomBytes(9).toString('base64url') }));
  const hashes = await Promise.all(signIns.map((one) => hashPassword(one.password)));
  const minnow = await readMinnow();
  const seeded = await inTransaction(db, async (tx) => {
    if (!(await isEmpty(tx))) return false;
    await insertDemo(tx, signIns, hashes, minnow);
    // Just before the people are there for all: a seeding cut short leaves a list of nobody, never people without a
    // password; and one that comes too late finds people here and leaves the list alone.
    await keepSignIns(folder, signIns);
    return true;
  });
  return { seeded, signIns: seeded ? signIns : [] };
}

async function keepSignIns(folder: string, signIns: readonly DemoSignIn[]): Promise<void> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const file = join(folder, 'sign-ins.json');
  await writeFile(`${file}.new`, `${JSON.stringify(signIns, null, 2)}\n`, { mode: 0o600 });
  await rename(`${file}.new`, file);
}

async function insertDemo(
  tx: Database,
  signIns: readonly DemoSignIn[],
  hashes: readonly string[],
  minnow: Design,
): Promise<void> {
  const now = new Date();
  const shopId = newId();
  await tx.insert(shop).values({ id: shopId, name: DEMO_SHOP, createdAt: now });
  const people = signIns.map((one, i) => ({ ...one, personId: newId(), hash: hashes[i]! }));
  for (const one of people) {
    await insertPerson(tx, one, now);
    if (one.role === 'designer' || one.role === 'installer') {
      await tx.insert(shopMember).values({ shopId, personId: one.personId, admin: one.admin, joinedAt: now });
    }
  }
  const designer = people.find((one) => one.admin)!;
  const vesselId = newId();
  await insertVessel(tx, {
    vesselId,
    shopId,
    personId: designer.personId,
    design: minnow,
    deed: 'vessel-imported',
  });
  const others = people.filter((one) => one !== designer);
  await tx
    .insert(vesselMember)
    .values(others.map(({ personId, role }) => ({ vesselId, personId, role, joinedAt: now })));
  await insertRevision(tx, {
    vesselId,
    personId: designer.personId,
    id: newId(),
    seq: 0,
    note: 'As fitted and handed over',
  });
}

async function insertPerson(
  tx: Database,
  one: { personId: string; name: string; email: string; hash: string },
  now: Date,
): Promise<void> {
  const { personId, name, email, hash } = one;
  await tx.insert(person).values({ id: personId, name, email, emailVerified: true, createdAt: now, updatedAt: now });
  await tx.insert(credential).values({
    id: newId(),
    accountId: personId,
    providerId: 'credential',
    userId: personId,
    password: hash,
    createdAt: now,
    updatedAt: now,
  });
}

async function isEmpty(db: Database): Promise<boolean> {
  const [anyone] = await db.select({ id: person.id }).from(person).limit(1);
  return anyone === undefined;
}

async function readMinnow(): Promise<Design> {
  const file = fileURLToPath(new URL('./minnow.ampwright.json', import.meta.url));
  const read = readDesign(await readFile(file, 'utf8'));
  if (!read.ok) throw new Error(`minnow.ampwright.json: ${read.path}: ${read.reason}`);
  return read.design;
}
