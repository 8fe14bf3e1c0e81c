import type { HeldCounts } from '@/lib/store/queries/held';
import type { SyncStatus } from '@/lib/store/rows';

/** What the badge says, always in words. What is only here comes first; a refusal that waits for a person before it. */
export function badgeWords(held: HeldCounts, status: SyncStatus, clock: (ms: number) => string): string {
  const count = held.entries + held.photos;
  const refused = held.refused + held.refusedPhotos;
  if (refused > 0) return `${refused} need you`;
  if (count > 0 && status.state === 'sign-in') return `Sign in to send ${count}`;
  if (count > 0 && status.state === 'update-needed') return `Update to send ${count}`;
  if (count > 0) return `${count} held here`;
  if (status.state === 'sign-in') return 'Signed out';
  return status.lastSuccessAt === null ? 'Nothing held' : `All sent ${clock(status.lastSuccessAt)}`;
}

const plural = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;

/** What is held here, counted by sort: "11 entries and 1 photo". */
export function heldWords({ entries, photos }: Pick<HeldCounts, 'entries' | 'photos'>): string {
  const parts = [
    entries > 0 && plural(entries, 'entry', 'entries'),
    photos > 0 && plural(photos, 'photo', 'photos'),
  ].filter(Boolean);
  return parts.join(' and ') || 'nothing';
}
