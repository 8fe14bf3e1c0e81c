import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = import.meta.dirname;
const alias = {
  '@': root,
  // Marks server files for the browser bundle; in tests there is nothing to mark.
  'server-only': path.join(root, 'tests/support/server-only.ts'),
};

export default defineConfig({
  resolve: { alias },
  oxc: { jsx: { runtime: 'automatic' } },
  test: {
    env: { TZ: 'UTC' },
    testTimeout: 30_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'pure',
          include: ['tests/{domain,reference,design,project}/**/*.test.ts'],
          environment: 'node',
        },
      },
      {
        extends: true,
        test: {
          name: 'phone',
          include: ['tests/{store,sync,device,components,worker}/**/*.test.{ts,tsx}'],
          environment: 'happy-dom',
          setupFiles: ['fake-indexeddb/auto'],
        },
      },
      {
        extends: true,
        test: {
          name: 'server',
          include: ['tests/{server,migrations,simulation,scripts}/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/postgres-global.ts'],
          setupFiles: ['tests/support/environment.ts'],
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
