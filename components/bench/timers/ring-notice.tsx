'use client';
import { useState } from 'react';
import { askToNotify, notifyState } from '@/lib/device/notify';
import { playTone, unlockSound } from '@/lib/device/alarm-sound';
import { ActButton } from '../entry/act-button';

/** What the timers can and cannot do here, in words that promise no more. */
export function RingNotice() {
  const [may, setMay] = useState(notifyState);
  const [heard, setHeard] = useState<'untried' | 'played' | 'silent'>('untried');

  async function tryTone() {
    setHeard((await unlockSound()) && playTone('end') ? 'played' : 'silent');
  }

  return (
    <section aria-label="What the timers can do" className="grid gap-3 border-y border-line py-3 text-[1.0625rem]">
      <p className="text-soft">
        The times keep right whatever happens to the phone. Holdfast rings only while it is open and the screen is on;
        otherwise it tells you when you come back. For a long wait set your phone’s own alarm too.
      </p>
      <div className="grid grid-cols-2 gap-6">
        <ActButton onClick={() => void tryTone()}>Hear the tone</ActButton>
        {may === 'unasked' && (
          <ActButton onClick={() => void askToNotify().then(setMay)}>Allow notifications</ActButton>
        )}
      </div>
      {heard === 'played' && (
        <p>That is the tone. If you heard nothing, turn the phone’s sound up and silent mode off.</p>
      )}
      {heard === 'silent' && <p>This phone lets no sound out just now. The screen will flash all the same.</p>}
      {may === 'denied' && (
        <p className="text-soft">Notifications are refused for Holdfast in this browser’s settings.</p>
      )}
    </section>
  );
}
