import { openDB, type DBSchema, type IDBPDatabase } from 'idb';

import type { Change } from '#shared/api/design.ts';

/** Changes of one person on one vessel that the server has not acknowledged; they outlive the page. */
export interface Outbox {
  list(): Promise<Change[]>;
  add(change: Change): Promise<void>;
  remove(id: string): Promise<void>;
  /** The same place in the queue, another change. */
  replace(id: string, change: Change): Promise<void>;
}

interface OutboxSchema extends DBSchema {
  waiting: {
    key: number;
    value: { order?: number; scope: string; id: string; change: Change };
    indexes: { scope: string; id: string };
  };
}

export async function openOutbox(personId: string, vesselId: string): Promise<Outbox> {
  try {
    const database = await openDatabase();
    return keepOnDevice(database, `${personId}:${vesselId}`);
  } catch {
    // A browser that gives no storage (a private window with storage off) still draws and saves while it is online.
    return keepInMemory();
  }
}

function openDatabase(): Promise<IDBPDatabase<OutboxSchema>> {
  return openDB<OutboxSchema>('ampwright', 1, {
    upgrade(database) {
      const store = database.createObjectStore('waiting', { keyPath: 'order', autoIncrement: true });
      store.createIndex('scope', 'scope');
      store.createIndex('id', 'id');
    },
  });
}

function keepOnDevice(database: IDBPDatabase<OutboxSchema>, scope: string): Outbox {
  return {
    async list() {
      const rows = await database.getAllFromIndex('waiting', 'scope', scope);
      return rows.map((row) => row.change);
    },
    async add(change) {
      await database.add('waiting', { scope, id: change.id, change });
    },
    async remove(id) {
      const key = await database.getKeyFromIndex('waiting', 'id', id);
      if (key !== undefined) await database.delete('waiting', key);
    },
    async replace(id, change) {
      const order = await database.getKeyFromIndex('waiting', 'id', id);
      if (order !== undefined) await database.put('waiting', { order, scope, id: change.id, change });
    },
  };
}

export function keepInMemory(): Outbox {
  let changes: Change[] = [];
  return {
    list: async () => [...changes],
    add: async (change) => void changes.push(change),
    remove: async (id) => {
      changes = changes.filter((change) => change.id !== id);
    },
    replace: async (id, again) => {
      changes = changes.map((change) => (change.id === id ? again : change));
    },
  };
}
