'use client';
import { useSyncExternalStore } from 'react';
import { shouldInstallFirst } from '@/lib/device/install-hint';
import { Notice } from '@/components/ui/notice';
import { heldWords } from '@/components/sync/sync-words';
import { useHeld } from '@/components/sync/use-held';

const never = () => () => {};

/** On an iPhone's browser tab: install first, and send what is held, since the installed program starts with nothing. */
export function InstallHint() {
  const wanted = useSyncExternalStore(never, shouldInstallFirst, () => false);
  const { held } = useHeld();
  if (!wanted) return null;
  return (
    <Notice tone="wait" title="Put Holdfast on your Home Screen first.">
      Share, then Add to Home Screen. In a browser tab this phone clears what is kept after a week without a visit; the
      installed one it leaves alone. The two do not share records
      {held.entries + held.photos > 0
        ? `, and ${heldWords(held)} are only in this tab: let them be sent before you change over.`
        : ', so change over before you begin.'}
    </Notice>
  );
}
