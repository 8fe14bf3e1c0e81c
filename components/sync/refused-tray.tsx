'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useState } from 'react';
import { describeEntry } from '@/lib/domain/build/describe-entry';
import { getBuild, getPlan } from '@/lib/store/queries/builds';
import { getRefused, getRefusedPhotos } from '@/lib/store/queries/held';
import { sendAgain } from '@/lib/store/mutations/send-again';
import type { EntryRow } from '@/lib/store/rows';
import { dayAndTime } from '@/components/bench/entry/time-words';
import { useClock } from '@/components/bench/entry/use-clock';
import { useBench } from '@/components/bench/shell/bench-context';
import { useSyncAgent } from './sync-agent';
import { ActButton } from '@/components/bench/entry/act-button';

/**
 * What the server refused, each with its reason and its words, which can be copied. Nothing leaves by itself; all of it
 * can be sent once more when what stood in the way has been put right.
 */
export function RefusedTray() {
  const { db } = useBench();
  const { sendNow } = useSyncAgent();
  const [fault, setFault] = useState<string | null>(null);
  const refused = useLiveQuery(() => getRefused(db), [db]);
  const photos = useLiveQuery(() => getRefusedPhotos(db), [db]);
  const clock = useClock(60_000);

  async function again() {
    const notHeld = await sendAgain(db);
    setFault(notHeld?.message ?? null);
    if (!notHeld) await sendNow();
  }

  if (!refused?.length && !photos?.length) return null;
  return (
    <section aria-labelledby="refused" className="grid gap-3">
      <h2 id="refused" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Needs you
      </h2>
      <p className="text-soft">The server would not take these. They stay here; the rest goes on without them.</p>
      <ul>
        {refused?.map((entry) => (
          <li key={entry.id} className="border-b border-line py-3">
            <RefusedEntry entry={entry} when={dayAndTime(entry.madeAt, clock)} />
          </li>
        ))}
        {photos?.map((photo) => (
          <li key={photo.sha256} className="border-b border-line py-3">
            A photo of {dayAndTime(photo.addedAt, clock)}
            {photo.refusal && <span className="block font-semibold text-red">{photo.refusal}</span>}
          </li>
        ))}
      </ul>
      <ActButton className="justify-self-start" onClick={() => void again()}>
        Send these again
      </ActButton>
      {fault && (
        <p role="alert" className="font-semibold text-red">
          {fault}
        </p>
      )}
    </section>
  );
}

function RefusedEntry({ entry, when }: { entry: EntryRow; when: string }) {
  const { db, format } = useBench();
  const [copied, setCopied] = useState<'no' | 'yes' | 'failed'>('no');
  const plan = useLiveQuery(async () => {
    const build = await getBuild(db, entry.buildId);
    return build && getPlan(db, build.contentHash);
  }, [db, entry.buildId]);
  const words = plan ? describeEntry(entry, plan, { formatLength: format }) : entry.kind;

  async function copy() {
    try {
      await navigator.clipboard.writeText(
        `${when}: ${words}\n${JSON.stringify({ target: entry.target, value: entry.value })}`,
      );
      setCopied('yes');
    } catch {
      // Some browsers refuse; saving as a file, above, always works.
      setCopied('failed');
    }
  }

  return (
    <div className="grid gap-2">
      <p className="break-words">
        <span className="text-soft">{when}</span> {words}
      </p>
      <p className="font-semibold text-red">{entry.refusal?.message ?? 'Refused'}</p>
      <ActButton className="justify-self-start" onClick={() => void copy()}>
        {copied === 'yes' ? 'Copied' : 'Copy its words'}
      </ActButton>
      {copied === 'failed' && <p>This browser does not let it be copied. Save as a file instead.</p>}
    </div>
  );
}
