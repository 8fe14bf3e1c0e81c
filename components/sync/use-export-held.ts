'use client';
import { saveFile } from '@/components/bench/entry/save-file';
import { useBench } from '@/components/bench/shell/bench-context';
import { exportHeld } from '@/lib/store/export-held';
import { dayKey } from '@/components/bench/entry/time-words';

/** Saves all that is only on this phone as one file. */
export function useExportHeld(): () => Promise<void> {
  const { db } = useBench();
  return async () => saveFile(`holdfast-held-${dayKey(Date.now())}.json`, 'application/json', await exportHeld(db));
}
