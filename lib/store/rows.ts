import type { StandingEntry } from '../domain/build/entry';
import type { BuildState } from '../domain/build/state';
import type { RefusalCode } from '../domain/build/wire';

/** `held`: only on this phone. `accepted`: the server has it. `refused`: the server said no, and it waits in the tray. */
export type EntrySync = 'held' | 'accepted' | 'refused';

export type EntryRow = StandingEntry & {
  sync: EntrySync;
  refusal?: { code: RefusalCode; message: string };
};

export interface CrewName {
  accountId: string;
  name: string;
  role: string;
}

export interface BuildRow {
  id: string;
  name: string;
  role: 'owner' | 'helper' | 'onlooker';
  planRevisionId: string;
  contentHash: string;
  crew: CrewName[];
  /** Position up to which others' entries are here. */
  cursor: number;
  /** Epoch of the server's database when it last answered (S7). */
  epoch: string;
  /** Greatest stamp among the entries here, estimates included. */
  greatestStamp: number | null;
  state: BuildState;
  /** When the pack was verified whole, ms. */
  packReadyAt: number;
  packBytes: number;
  packFiles: { title: string; kind: string; url: string; sha256: string; bytes: number; mediaType: string }[];
  lastUsedAt: number;
}

export interface PhotoRow {
  buildId: string;
  sha256: string;
  bytes: ArrayBuffer;
  mediaType: string;
  length: number;
  /** `confirmed`: the server has said that it holds this hash. */
  sync: 'held' | 'confirmed' | 'refused';
  addedAt: number;
  refusal?: string;
}

export interface DraftRow {
  /** `note/<build>/<step>` and the like. */
  key: string;
  text: string;
  savedAt: number;
}

export type SyncState = 'idle' | 'sending' | 'waiting' | 'no-signal' | 'sign-in' | 'update-needed';

/** What the badge and the panel say of sending. */
export interface SyncStatus {
  state: SyncState;
  lastSuccessAt: number | null;
  /** In words for the person; null after a success. */
  lastError: string | null;
  nextTryAt: number | null;
  /** Server's clock minus this phone's, ms; null before the first answer. */
  clockOffsetMs: number | null;
}

export interface EmergencyCard {
  address: string;
  number: string;
  kitPlace: string;
  contact: string;
}

export interface FactRow {
  key: string;
  value: unknown;
}
