'use client';
import { createContext, useContext, useEffect, useMemo, useRef, type ReactNode } from 'react';
import type { SyncRunner } from '@/lib/sync/runner';
import { useBench } from '@/components/bench/shell/bench-context';

interface SyncAgentValue {
  /** Sends now, or as soon as the agent is loaded. */
  sendNow: () => Promise<void>;
}

const SyncAgentContext = createContext<SyncAgentValue | null>(null);

export function useSyncAgent(): SyncAgentValue {
  const agent = useContext(SyncAgentContext);
  if (!agent) throw new Error('useSyncAgent is used outside <SyncAgent>');
  return agent;
}

/** Runs the sync agent of the account while the bench is open; loaded after the first paint, since nothing waits for it. */
export function SyncAgent({ children }: { children: ReactNode }) {
  const { db } = useBench();
  const runner = useRef<Promise<SyncRunner> | null>(null);
  useEffect(() => {
    let wanted = true;
    const started = import('@/lib/sync/browser-runner').then(({ startBrowserRunner }) => startBrowserRunner(db));
    runner.current = started;
    started.then(
      (running) => {
        if (!wanted) running.stop();
      },
      // Without its chunk nothing is sent; the badge goes on saying what is held here.
      (error: unknown) => console.error(error),
    );
    return () => {
      wanted = false;
      runner.current = null;
      void started.then(
        (running) => running.stop(),
        () => undefined,
      );
    };
  }, [db]);
  const value = useMemo(() => ({ sendNow: async () => (await runner.current)?.syncNow() }), []);
  return <SyncAgentContext.Provider value={value}>{children}</SyncAgentContext.Provider>;
}
