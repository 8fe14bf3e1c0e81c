import type { PassedLock } from './kinds';

export interface Lock {
  lock: PassedLock['lock'];
  /** A lock of order can be passed with a departure; one that protects needs its own confirmation, named in the log. */
  protects: PassedLock['protects'];
  /** Step, face, key size or tool that it is about. */
  about: string;
  /** What it waits for, in words. */
  words: string;
  /** What can go wrong when it is passed; for locks that protect. */
  danger?: string;
  /** When time alone opens it, ms since 1970; null while a person must act first. */
  until?: { earliest: number; latest: number } | null;
}

export interface LockOptions {
  /** Time for the words, in the person's own way: "15:10", "Wed 15:10". */
  formatTime?: (ms: number) => string;
  /** Tools that this person is cleared for in a shared shop; undefined where there is no shop to say so. */
  clearances?: readonly string[];
}
