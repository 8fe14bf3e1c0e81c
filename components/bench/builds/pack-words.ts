import type { BuildRow } from '@/lib/store/rows';
import { clockTime, dateWords } from '../entry/time-words';

/** Size in the units people know: "820 KB", "1.2 MB". Thousands, as phones show it. */
export function byteWords(bytes: number): string {
  if (bytes < 1_000) return `${bytes} bytes`;
  if (bytes < 999_500) return `${Math.round(bytes / 1_000)} KB`;
  if (bytes < 999_500_000) return `${(bytes / 1_000_000).toFixed(1)} MB`;
  return `${(bytes / 1_000_000_000).toFixed(1)} GB`;
}

/** What a verified pack says of itself: "Ready with no signal · 1.2 MB · 1 Dec 2026, 14:02". */
export function packWords({ packBytes, packReadyAt }: Pick<BuildRow, 'packBytes' | 'packReadyAt'>): string {
  return `Ready with no signal · ${byteWords(packBytes)} · ${dateWords(packReadyAt)}, ${clockTime(packReadyAt)}`;
}
