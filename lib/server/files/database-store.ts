import 'server-only';
import type { Models } from '@/models';
import type { FileStore } from './file-store';

/** Keeps bytes in PostgreSQL: one thing to back up. */
export function databaseStore({ FileBytes }: Pick<Models, 'FileBytes'>): FileStore {
  return {
    kind: 'database',
    put: async (fileId, content) => {
      await FileBytes.bulkCreate([{ fileId, content: Buffer.from(content) }], { ignoreDuplicates: true });
    },
    get: async (fileId) => (await FileBytes.findByPk(fileId))?.content ?? null,
    has: async (fileId) => (await FileBytes.count({ where: { fileId } })) > 0,
    remove: async (fileId) => {
      await FileBytes.destroy({ where: { fileId } });
    },
  };
}
