'use client';
import { useState } from 'react';
import { askToPersist } from '@/lib/device/storage-health';
import type { PackProgress, PackResult } from '@/lib/device/pack';
import { shellIsReady } from '@/lib/device/service-worker';
import type { BuildRow } from '@/lib/store/rows';
import { useSyncAgent } from '@/components/sync/sync-agent';
import { ActButton } from '../entry/act-button';
import { Notice } from '@/components/ui/notice';
import { useAnnounce } from '../shell/announcer';
import { goTo } from '../shell/address';
import { useBench } from '../shell/bench-context';
import type { ServerBuild } from './ask-for-builds';
import { byteWords, packWords } from './pack-words';

const NO_SHELL =
  'The pack is here, and the bench’s own program is not yet: this browser has not stored it. Keep this page open with a signal for a minute, then try again.';

/** One build: taken with visible progress, verified, then said to be ready with its size. */
export function TakeRow({ build, here }: { build: ServerBuild; here: BuildRow | undefined }) {
  const { db } = useBench();
  const announce = useAnnounce();
  const { sendNow } = useSyncAgent();
  const [progress, setProgress] = useState<PackProgress | null>(null);
  const [failed, setFailed] = useState<string | null>(null);

  async function take() {
    setFailed(null);
    setProgress({ doneBytes: 0, allBytes: 0, file: '' });
    // A meaningful moment to ask the browser to keep this storage; its answer stands in the settings.
    void askToPersist();
    const result = await download();
    setProgress(null);
    if (result.ok) announce(`${build.name} is ready with no signal`);
    else setFailed(result.message);
  }

  async function download(): Promise<PackResult> {
    try {
      const { takeToBench } = await import('@/lib/device/pack');
      const taken = await takeToBench({
        db,
        buildId: build.id,
        fetch: (input) => fetch(input, { cache: 'no-store' }),
        caches: window.caches,
        onProgress: setProgress,
      });
      if (!taken.ok) return taken;
      // What is done already belongs to what the bench needs: it is fetched before the build is said to be ready.
      await sendNow();
      if (await shellIsReady()) return taken;
      return { ok: false, code: 'broken', message: NO_SHELL };
    } catch (error) {
      console.error(error);
      const why = error instanceof Error ? error.message : String(error);
      return { ok: false, code: 'broken', message: `It was not taken (${why}). Try again.` };
    }
  }

  return (
    <div className="grid gap-3 rounded-plate border-2 border-iron bg-paper p-4">
      <div>
        <h2 className="text-[1.75rem]">{build.name}</h2>
        {build.planTitle !== build.name && <p className="text-soft">{build.planTitle}</p>}
      </div>
      {here && !progress && <p className="font-semibold text-green">{packWords(here)}</p>}
      {progress && (
        <div>
          <progress
            className="h-4 w-full accent-blue"
            value={progress.allBytes > 0 ? progress.doneBytes : undefined}
            max={progress.allBytes || 1}
            aria-label={`Taking ${build.name} to the bench`}
          />
          <p className="figures text-[1.0625rem]">
            {progress.allBytes > 0
              ? `${byteWords(progress.doneBytes)} of ${byteWords(progress.allBytes)}. ${progress.file}`
              : 'Asking what it needs.'}
          </p>
        </div>
      )}
      {failed && (
        <Notice tone="danger" title="Not ready." live="alert">
          {failed} {here && 'What was ready before still is.'}
        </Notice>
      )}
      <div className="grid gap-6 min-[420px]:grid-cols-2">
        {here && <ActButton onClick={() => goTo({ buildId: build.id })}>Open it</ActButton>}
        <ActButton pending={progress !== null} pendingLabel="Taking it" onClick={() => void take()}>
          {here ? 'Take it afresh' : 'Take it to the bench'}
        </ActButton>
      </div>
    </div>
  );
}
