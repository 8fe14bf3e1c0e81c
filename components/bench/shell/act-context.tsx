'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { lastUndoable } from '@/lib/domain/build/undo';
import { sessionsOf } from '@/lib/domain/build/views';
import type { AccountDatabase } from '@/lib/store/database';
import { getEntries } from '@/lib/store/queries/builds';
import type { Saved } from '@/lib/store/saved';
import { loadActs, type Acts } from './acts';
import { useAnnounce } from './announcer';
import { useBench } from './bench-context';
import { useBuild } from './build-context';

/** The last act of this phone, for the undo that stays until the next one. */
export interface LastAct {
  entryIds: string[];
  words: string;
  undone: boolean;
}

interface ActContextValue {
  /**
   * Does one act and, when it is durable, says so. Opens a session first when none is open.
   *
   * @param said  words for the undo bar and the live region
   * @param run   the mutations; the first that is refused ends the act; none at all only opens the session
   * @returns true when all of it was saved
   */
  act: (said: string, run: (acts: Acts, db: AccountDatabase) => Promise<Saved | Saved[]>) => Promise<boolean>;
  last: LastAct | null;
  undoLast: () => Promise<void>;
  /** What went wrong with the last act, in words; null after one that was saved. */
  fault: string | null;
  dismissFault: () => void;
}

const ActContext = createContext<ActContextValue | null>(null);

export function useActs(): ActContextValue {
  const acts = useContext(ActContext);
  if (!acts) throw new Error('useActs is used outside <ActProvider>');
  return acts;
}

export function ActProvider({ children }: { children: ReactNode }) {
  const { db } = useBench();
  const { build, state } = useBuild();
  const announce = useAnnounce();
  const [lastHere, setLastHere] = useState<LastAct | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const buildId = build.id;
  const isOpen = useRef(false);
  const sessionOpen = useMemo(() => sessionsOf(state).some(({ openedAt, closedAt }) => openedAt && !closedAt), [state]);

  useEffect(() => {
    isOpen.current = sessionOpen;
  }, [sessionOpen]);
  const before = useActBefore(useIdleActs(), lastHere === null);
  const last = lastHere ?? before;

  const attempt = useCallback(async (run: (acts: Acts) => Promise<Saved | Saved[]>): Promise<string[] | null> => {
    try {
      const results = [await run(await loadActs())].flat();
      const refused = results.find((result) => !result.ok);
      if (refused && !refused.ok) {
        setFault(refused.message);
        return null;
      }
      setFault(null);
      return results.flatMap((result) => (result.ok ? [result.entryId] : []));
    } catch (error) {
      console.error(error);
      const why = error instanceof Error ? error.message : String(error);
      setFault(`Not saved (${why}). Try again; if it stays so, close Holdfast and open it again.`);
      return null;
    }
  }, []);

  const act = useCallback<ActContextValue['act']>(
    async (said, run) => {
      const entryIds = await attempt(async (acts) => {
        if (!isOpen.current) {
          const opened = await acts.openSession(db, { buildId, at: db.clock() });
          if (!opened.ok) return opened;
          isOpen.current = true;
        }
        return run(acts, db);
      });
      if (!entryIds) return false;
      // Opening a session alone is nothing to undo.
      if (entryIds.length > 0) setLastHere({ entryIds, words: said, undone: false });
      announce(said);
      return true;
    },
    [announce, attempt, buildId, db],
  );

  const undoLast = useCallback(async () => {
    if (!last) return;
    const undone = !last.undone;
    const order = undone ? [...last.entryIds].reverse() : last.entryIds;
    const done = await attempt(async (acts) => {
      const results: Saved[] = [];
      for (const entryId of order) results.push(await acts.undoEntry(db, { buildId, entryId, undone }));
      return results;
    });
    if (!done) return;
    setLastHere({ ...last, undone });
    announce(undone ? `Undone: ${last.words}` : `Put back: ${last.words}`);
  }, [announce, attempt, buildId, db, last]);

  const dismissFault = useCallback(() => setFault(null), []);
  const value = useMemo(
    () => ({ act, last, undoLast, fault, dismissFault }),
    [act, last, undoLast, fault, dismissFault],
  );
  return <ActContext.Provider value={value}>{children}</ActContext.Provider>;
}

/**
 * The last act of this phone before the page was opened, read from the log, so that a wrong tick before a dead battery
 * can be undone. Not looked for any more once there is an act of this page.
 */
function useActBefore(acts: Acts | null, wanted: boolean): LastAct | null {
  const { db, formatRead: formatLength } = useBench();
  const { build, plan } = useBuild();
  const entry = useLiveQuery(
    async () => (wanted ? lastUndoable(await getEntries(db, build.id), db.deviceId) : null),
    [db, build.id, wanted],
  );
  return useMemo(() => {
    if (!entry || !acts) return null;
    return { entryIds: [entry.id], words: acts.describeEntry(entry, plan, { formatLength }), undone: false };
  }, [acts, entry, plan, formatLength]);
}

/** The acts, loaded when the screen has been drawn: before the first tap, as a rule. One that comes sooner loads them. */
function useIdleActs(): Acts | null {
  const [acts, setActs] = useState<{ loaded: Acts } | null>(null);
  useEffect(() => {
    const load = () => {
      loadActs()
        .then((loaded) => setActs({ loaded }))
        .catch((error: unknown) => console.error(error));
    };
    if (typeof requestIdleCallback === 'undefined') {
      const timer = setTimeout(load, 300);
      return () => clearTimeout(timer);
    }
    const idle = requestIdleCallback(load, { timeout: 2_000 });
    return () => cancelIdleCallback(idle);
  }, []);
  return acts?.loaded ?? null;
}
