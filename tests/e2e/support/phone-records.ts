import type { Page } from '@playwright/test';

export interface LocalEntry {
  id: string;
  sync: string;
  position: number | null;
  kind: string;
}

/** All rows of one store of the account's database in this browser; of the first account's, unless one is named. */
export function recordsOnPhone<T>(page: Page, store: string, accountId?: string): Promise<T[]> {
  return page.evaluate(
    async ([name, account]) => {
      const found = (await indexedDB.databases()).find((each) =>
        account ? each.name === `holdfast-${account}` : /^holdfast-[0-9a-f]{8}-/.test(each.name ?? ''),
      );
      const db = await new Promise<IDBDatabase>((resolve, reject) => {
        const request = indexedDB.open(found!.name!);
        request.onsuccess = () => resolve(request.result);
        request.onerror = () => reject(request.error);
      });
      const rows = await new Promise<unknown[]>((resolve, reject) => {
        const request = db.transaction(name!).objectStore(name!).getAll();
        request.onsuccess = () => resolve(request.result as unknown[]);
        request.onerror = () => reject(request.error);
      });
      db.close();
      return rows;
    },
    [store, accountId],
  ) as Promise<T[]>;
}

export const entriesOnPhone = (page: Page, accountId?: string) =>
  recordsOnPhone<LocalEntry>(page, 'entries', accountId);

/** Entries that are only in this browser. */
export const heldOnPhone = async (page: Page, accountId?: string) =>
  (await entriesOnPhone(page, accountId)).filter(({ sync }) => sync === 'held');
