'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useBench } from '@/components/bench/shell/bench-context';
import { getHeldCounts, getSyncStatus, noSyncYet, type HeldCounts } from '@/lib/store/queries/held';
import type { SyncStatus } from '@/lib/store/rows';

const nothing: HeldCounts = { entries: 0, photos: 0, refused: 0, refusedPhotos: 0, oldestAt: null };

/** What is only on this phone, and how sending stands; `known` is false until the phone has said so. */
export function useHeld(): { held: HeldCounts; status: SyncStatus; known: boolean } {
  const { db } = useBench();
  const held = useLiveQuery(() => getHeldCounts(db), [db]);
  const status = useLiveQuery(() => getSyncStatus(db), [db]);
  return { held: held ?? nothing, status: status ?? noSyncYet, known: held !== undefined && status !== undefined };
}
