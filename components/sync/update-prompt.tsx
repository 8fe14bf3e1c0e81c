'use client';
import { useEffect, useState } from 'react';
import { registerServiceWorker } from '@/lib/device/service-worker';
import { Button } from '@/components/ui/button';

// One registration for each page; the newer version that waits is remembered for every view that shows the prompt.
let takeOver: (() => void) | null = null;
const watchers = new Set<(takeOver: () => void) => void>();
let registered = false;

/** Puts the bench's own program on this phone. Called once the bench is on screen. */
export function installShell(): void {
  if (registered) return;
  registered = true;
  registerServiceWorker((ready) => {
    takeOver = ready;
    for (const watcher of watchers) watcher(ready);
  }).catch((error: unknown) => console.error('The offline program could not be installed.', error));
}

/** A newer version waits: it takes over when the person says so, never in the middle of a cut. */
export function UpdatePrompt() {
  const [ready, setReady] = useState(() => takeOver);
  useEffect(() => {
    const watcher = (act: () => void) => setReady(() => act);
    watchers.add(watcher);
    installShell();
    return () => {
      watchers.delete(watcher);
    };
  }, []);
  if (!ready) return null;
  return (
    <div role="status" className="flex items-center justify-between gap-3 border-b-2 border-iron bg-paper pl-4">
      <p className="text-[1.0625rem]">A newer Holdfast is here. What you did is kept.</p>
      <Button kind="plain" className="shrink-0 border-l border-line text-blue!" onClick={ready}>
        Change over
      </Button>
    </div>
  );
}
