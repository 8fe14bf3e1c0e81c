'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useCallback, useEffect, useRef, useState } from 'react';
import { saveDraft } from '@/lib/store/mutations/save-draft';
import { getDraft } from '@/lib/store/queries/held';
import { useBench } from '../shell/bench-context';

/** Typing is kept at most this much later, ms; leaving the page keeps it at once. */
const KEEP_AFTER_MS = 250;

export interface Draft {
  text: string;
  setText: (text: string) => void;
  /** Takes the draft away here; its record goes with the mutation that used it, or now. */
  clear: () => void;
  /** Why the words could not be kept while typed; null when they were. */
  fault: string | null;
  /** False until the phone has said what was typed before. */
  known: boolean;
}

/** Words kept as they are typed, under a key such as `note/<build>/<step>`: a reload or a dead battery loses none. */
export function useDraft(key: string): Draft {
  const { db } = useBench();
  const stored = useLiveQuery(async () => ({ key, text: await getDraft(db, key) }), [db, key]);
  const [typed, setTyped] = useState<{ key: string; text: string } | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const waiting = useRef<{ text: string; timer: ReturnType<typeof setTimeout> } | null>(null);

  const keep = useCallback(
    async (text: string) => {
      const result = await saveDraft(db, key, text);
      setFault(result && !result.ok ? result.message : null);
    },
    [db, key],
  );

  useEffect(() => {
    const flush = () => {
      if (!waiting.current) return;
      clearTimeout(waiting.current.timer);
      void keep(waiting.current.text);
      waiting.current = null;
    };
    document.addEventListener('visibilitychange', flush);
    window.addEventListener('pagehide', flush);
    return () => {
      flush();
      document.removeEventListener('visibilitychange', flush);
      window.removeEventListener('pagehide', flush);
    };
  }, [keep]);

  const setText = useCallback(
    (text: string) => {
      setTyped({ key, text });
      if (waiting.current) clearTimeout(waiting.current.timer);
      const timer = setTimeout(() => {
        waiting.current = null;
        void keep(text);
      }, KEEP_AFTER_MS);
      waiting.current = { text, timer };
    },
    [keep, key],
  );

  const clear = useCallback(() => {
    if (waiting.current) clearTimeout(waiting.current.timer);
    waiting.current = null;
    setTyped({ key, text: '' });
    void keep('');
  }, [keep, key]);

  const here = typed?.key === key ? typed.text : undefined;
  const before = stored?.key === key ? stored.text : undefined;
  return { text: here ?? before ?? '', setText, clear, fault, known: before !== undefined };
}
