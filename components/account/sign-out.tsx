'use client';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import { packCacheName } from '@/lib/device/pack';
import { openAccountDatabase } from '@/lib/store/database';
import { getKnownAccounts } from '@/lib/store/device-database';
import { getHeldCounts, type HeldCounts } from '@/lib/store/queries/held';
import { discardAccount, keepHere } from '@/lib/store/sign-out';
import { signOut } from './sign-in-out';
import { useHydrated } from './use-hydrated';

type Stage =
  | { at: 'start' }
  | { at: 'working' }
  /** Records that are only in this browser stand in the way of a plain sign-out. */
  | { at: 'held'; held: HeldCounts }
  /** This browser does not say what is held in it. */
  | { at: 'unknown'; words: string };

const none: HeldCounts = { entries: 0, photos: 0, refused: 0, refusedPhotos: 0, oldestAt: null };

/**
 * Signs this browser out. Where records of the account are only here, it says how many and asks: they are never thrown
 * away by signing out. Where everything was sent, the account's records go from this browser with the sign-in.
 */
export function SignOut({ accountId }: { accountId: string }) {
  const hydrated = useHydrated();
  const [stage, setStage] = useState<Stage>({ at: 'start' });
  const [failed, setFailed] = useState<string | null>(null);

  async function start() {
    setStage({ at: 'working' });
    try {
      const held = await heldHere(accountId);
      if (held.entries + held.photos + held.refused + held.refusedPhotos > 0) setStage({ at: 'held', held });
      else await leave('empty');
    } catch (error) {
      setStage({ at: 'unknown', words: error instanceof Error ? error.message : String(error) });
    }
  }

  async function leave(records: 'empty' | 'keep') {
    setStage({ at: 'working' });
    setFailed(null);
    const answer = await signOut();
    if (!answer.ok) {
      setStage({ at: 'start' });
      setFailed(answer.detail);
      return;
    }
    try {
      await (records === 'empty' ? emptyHere(accountId) : leaveHere(accountId));
    } finally {
      // A whole load, so that nothing of the page stays in memory.
      window.location.assign(new URL('/', window.location.href));
    }
  }

  return (
    <div className="grid justify-items-start gap-4">
      {(stage.at === 'start' || stage.at === 'working') && (
        <Button disabled={!hydrated} pending={stage.at === 'working'} pendingLabel="Signing out" onClick={start}>
          Sign out here
        </Button>
      )}
      <div aria-live="polite" className="w-full empty:hidden">
        {stage.at === 'held' && (
          <Notice tone="wait" title={`${heldWords(stage.held)} held here.`}>
            They are only in this browser until they are sent. At the bench you can send them, save them as a file, or
            throw them away.
          </Notice>
        )}
        {stage.at === 'unknown' && (
          <Notice tone="wait" title="This browser does not say what is held here.">
            {stage.words} Signing out leaves whatever there is.
          </Notice>
        )}
        {failed && (
          <Notice tone="info" title="Not signed out.">
            {failed}
          </Notice>
        )}
      </div>
      {(stage.at === 'held' || stage.at === 'unknown') && (
        <div className="flex flex-wrap gap-4">
          <a href="/bench?view=settings" className={linkLook.act}>
            See to them at the bench
          </a>
          <Button onClick={() => leave('keep')}>Sign out, keep them here</Button>
        </div>
      )}
    </div>
  );
}

async function isKnownHere(accountId: string): Promise<boolean> {
  return (await getKnownAccounts()).some((account) => account.accountId === accountId);
}

async function heldHere(accountId: string): Promise<HeldCounts> {
  return (await isKnownHere(accountId)) ? getHeldCounts(await openAccountDatabase(accountId)) : none;
}

async function emptyHere(accountId: string): Promise<void> {
  if (await isKnownHere(accountId)) await discardAccount(await openAccountDatabase(accountId), 0, '');
  if ('caches' in window) await caches.delete(packCacheName(accountId));
}

/** Where the storage does not open, nothing in it is touched. */
async function leaveHere(accountId: string): Promise<void> {
  await keepHere(await openAccountDatabase(accountId));
}

/** "12 entries and 2 photos" */
function heldWords({ entries, photos, refused, refusedPhotos }: HeldCounts): string {
  const parts = [
    [entries + refused, 'entry', 'entries'],
    [photos + refusedPhotos, 'photo', 'photos'],
  ] as const;
  return parts
    .filter(([count]) => count > 0)
    .map(([count, one, many]) => `${count} ${count === 1 ? one : many}`)
    .join(' and ');
}
