import type { Page } from '@playwright/test';

const BALLAST = 'ballast';

/** Fills what the browser still gives this origin, down to a few bytes, with a database beside the program's own. */
export function fillStorage(page: Page): Promise<number> {
  return page.evaluate(async (name) => {
    const db = await new Promise<IDBDatabase>((resolve, reject) => {
      const request = indexedDB.open(name, 1);
      request.onupgradeneeded = () => request.result.createObjectStore('weights', { autoIncrement: true });
      request.onsuccess = () => resolve(request.result);
      request.onerror = () => reject(request.error);
    });
    const put = (bytes: number) =>
      new Promise<boolean>((resolve) => {
        const writing = db.transaction('weights', 'readwrite', { durability: 'strict' });
        writing.oncomplete = () => resolve(true);
        writing.onabort = () => resolve(false);
        writing.objectStore('weights').add(crypto.getRandomValues(new Uint8Array(Math.min(bytes, 65_536))));
        for (let more = bytes - 65_536; more > 0; more -= 65_536)
          writing.objectStore('weights').add(crypto.getRandomValues(new Uint8Array(Math.min(more, 65_536))));
      });
    let filled = 0;
    for (let bytes = 1_048_576; bytes >= 1; bytes = Math.floor(bytes / 4)) while (await put(bytes)) filled += bytes;
    db.close();
    return filled;
  }, BALLAST);
}

/** Gives back what {@link fillStorage} took. */
export function makeRoom(page: Page): Promise<void> {
  return page.evaluate(
    (name) =>
      new Promise<void>((resolve, reject) => {
        const request = indexedDB.deleteDatabase(name);
        request.onsuccess = () => resolve();
        request.onerror = () => reject(request.error);
      }),
    BALLAST,
  );
}
