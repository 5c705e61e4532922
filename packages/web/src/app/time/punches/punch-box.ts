import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import type { KeptPunch } from './punch';

/** Where punches wait, apart for each member of each shop. */
export type PunchBox = {
  /** In their order. */
  read(owner: string): Promise<KeptPunch[]>;
  /** Changes an owner's punches in one step that no other tab can come between, and answers them as changed. */
  change(owner: string, to: (punches: readonly KeptPunch[]) => KeptPunch[]): Promise<KeptPunch[]>;
};

interface PunchSchema extends DBSchema {
  punches: { key: [string, number]; value: KeptPunch & { owner: string } };
}

/** Keeps punches in the browser's database: they outlive reloading, closing, and a dead battery. */
export async function openPunchBox(): Promise<PunchBox> {
  const database = await openDB<PunchSchema>('bookmatch-punches', 1, {
    upgrade: (db) => void db.createObjectStore('punches', { keyPath: ['owner', 'order'] }),
  });
  return {
    read: async (owner) => (await database.getAll('punches', all(owner))).map(withoutOwner),
    change: (owner, to) => changeIn(database, owner, to),
  };
}

async function changeIn(
  database: IDBPDatabase<PunchSchema>,
  owner: string,
  to: (punches: readonly KeptPunch[]) => KeptPunch[],
): Promise<KeptPunch[]> {
  const transaction = database.transaction('punches', 'readwrite', { durability: 'strict' });
  const before = (await transaction.store.getAll(all(owner))).map(withoutOwner);
  const after = to(before).toSorted((a, b) => a.order - b.order);
  await transaction.store.delete(all(owner));
  for (const punch of after) await transaction.store.put({ ...punch, owner });
  await transaction.done;
  return after;
}

/** For browsers that keep nothing: punches live as long as the page. */
export function memoryPunchBox(): PunchBox {
  const boxes = new Map<string, KeptPunch[]>();
  return {
    read: (owner) => Promise.resolve(boxes.get(owner) ?? []),
    change: (owner, to) => {
      const after = to(boxes.get(owner) ?? []).toSorted((a, b) => a.order - b.order);
      boxes.set(owner, after);
      return Promise.resolve(after);
    },
  };
}

const all = (owner: string): IDBKeyRange => IDBKeyRange.bound([owner, 0], [owner, Infinity]);

function withoutOwner({ owner: _owner, ...punch }: KeptPunch & { owner: string }): KeptPunch {
  return punch as KeptPunch;
}
