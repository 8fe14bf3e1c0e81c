'use client';
import { useState } from 'react';
import { DISCARD_WORD, discardAccount, keepHere } from '@/lib/store/sign-out';
import { saveSignOutOwed } from '@/lib/store/device-database';
import { packCacheName } from '@/lib/device/pack';
import { Button } from '@/components/ui/button';
import { ActButton } from '@/components/bench/entry/act-button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { useBench } from '@/components/bench/shell/bench-context';
import { heldWords } from './sync-words';
import { useExportHeld } from './use-export-held';
import { useHeld } from './use-held';
import { useSyncAgent } from './sync-agent';

/**
 * Signs out of this phone. With records that are only here it says how many and offers to send, keep, export or discard
 * them; discarding is typed, since nothing brings them back.
 */
export function SignOutForm({ onLeave }: { onLeave: () => void }) {
  const { db, account } = useBench();
  const { held, status } = useHeld();
  const { sendNow } = useSyncAgent();
  const exportHeld = useExportHeld();
  const [typed, setTyped] = useState('');
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const count = held.entries + held.photos + held.refused + held.refusedPhotos;

  async function leave(how: 'keep' | 'discard') {
    setBusy(true);
    setFault(null);
    const { signOut } = await import('@/components/account/sign-in-out');
    const answer = await signOut();
    // With no signal the sign-in cannot end at the server yet. Leaving this phone's bench is still the person's to do.
    if (!answer.ok && answer.code !== 'no-signal' && answer.code !== 'signed-out') {
      setFault(answer.detail);
      setBusy(false);
      return;
    }
    if (!answer.ok && answer.code === 'no-signal') await saveSignOutOwed(true);
    if (how === 'keep') await keepHere(db);
    else if (!(await discardAccount(db, count, typed))) {
      setFault(`Nothing was thrown away. Type ${DISCARD_WORD} first.`);
      setBusy(false);
      return;
    }
    if (how === 'discard' && 'caches' in window) await caches.delete(packCacheName(account.accountId));
    // A whole load, so that nothing of the account stays in the page's memory.
    window.location.assign(new URL('/bench', window.location.href));
  }

  return (
    <div className="grid gap-4 rounded-plate border-2 border-iron bg-paper p-4">
      {count > 0 ? (
        <>
          <Notice tone="wait" title={`${count} held here.`}>
            {heldWords({ entries: held.entries + held.refused, photos: held.photos + held.refusedPhotos })} are only on
            this phone
            {status.lastError && `: ${status.lastError}`}
          </Notice>
          <Button
            kind="plate"
            onClick={() => void sendNow()}
            pending={status.state === 'sending'}
            pendingLabel="Sending"
          >
            Send them now
          </Button>
          <div className="grid grid-cols-2 gap-6">
            <ActButton pending={busy} onClick={() => void leave('keep')}>
              Keep them here, sign out
            </ActButton>
            <ActButton onClick={() => void exportHeld()}>Save them as a file</ActButton>
          </div>
          <Field
            label={`Or throw them away: type ${DISCARD_WORD}`}
            hint="Nothing brings them back."
            error={fault ?? undefined}
          >
            <input
              autoCapitalize="none"
              autoComplete="off"
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
            />
          </Field>
          <ActButton
            kind="danger"
            disabled={typed.trim().toLowerCase() !== DISCARD_WORD}
            pending={busy}
            onClick={() => void leave('discard')}
          >
            Throw them away, sign out
          </ActButton>
        </>
      ) : (
        <>
          <p>All is sent. Signing out clears this account’s builds from this phone; they can be taken again.</p>
          {fault && <p className="font-semibold text-red">{fault}</p>}
          <Button kind="plate" pending={busy} pendingLabel="Signing out" onClick={() => void leave('discard')}>
            Sign out
          </Button>
        </>
      )}
      <ActButton onClick={onLeave}>Stay signed in</ActButton>
    </div>
  );
}
