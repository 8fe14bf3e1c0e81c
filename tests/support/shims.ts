import { chmodSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach } from 'vitest';

/** Programs that do as told, in a folder to be looked in first; anew for each test. */
export function useShims(): { folder: () => string; shim: (name: string, script: string) => void } {
  let folder = '';
  beforeEach(() => {
    // Not in the system's folder for temporary files, which a machine may have mounted so that nothing in it runs.
    folder = mkdtempSync('/var/tmp/holdfast-bin-');
    chmodSync(folder, 0o755);
    symlinkSync('/bin/sh', path.join(folder, 'sh'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));
  return {
    folder: () => folder,
    shim: (name, script) => {
      writeFileSync(path.join(folder, name), `#!/bin/sh\n${script}\n`);
      chmodSync(path.join(folder, name), 0o755);
    },
  };
}
