'use client';
import { useMemo } from 'react';
import type { Lock } from '@/lib/domain/build/locks';
import { useDraft } from '../entry/use-draft';
import { lockKey } from './plate-of';

interface PassedDraft {
  keys: string[];
  why: string;
}

const none: PassedDraft = { keys: [], why: '' };

/**
 * Locks of a step that the person has gone past, with the reason. Kept as a draft until the step is ticked, so that a
 * reload between the confirmation and the tick asks nothing twice.
 */
export function usePassedLocks(buildId: string, stepId: string) {
  const { text, setText, clear } = useDraft(`passed/${buildId}/${stepId}`);
  const { keys, why } = useMemo(() => readPassed(text), [text]);
  return {
    passed: useMemo(() => new Set(keys), [keys]),
    why,
    pass: (locks: readonly Lock[], reason: string) =>
      setText(JSON.stringify({ keys: [...keys, ...locks.map(lockKey)], why: reason })),
    clear,
  };
}

function readPassed(text: string): PassedDraft {
  if (!text) return none;
  try {
    const draft = JSON.parse(text) as Partial<PassedDraft>;
    return { keys: Array.isArray(draft.keys) ? draft.keys : [], why: typeof draft.why === 'string' ? draft.why : '' };
  } catch {
    // A draft cut off by a crash: the locks are asked about again.
    return none;
  }
}
