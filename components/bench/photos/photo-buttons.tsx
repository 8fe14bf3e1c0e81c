'use client';
import { useEffect, useRef, useState } from 'react';
import { clearDraft, saveDraft } from '@/lib/store/mutations/save-draft';
import { ActButton } from '../entry/act-button';
import { Notice } from '@/components/ui/notice';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { ASKED_PHOTO_KEY, type AskedPhotoDraft } from './asked-draft';

interface PhotoButtonsProps {
  stepId: string | null;
  /** The photo that the plan wants and this answers. */
  wantedId?: string | null;
  /** What the photo is of, for the camera's button. */
  of?: string;
}

/**
 * Camera and gallery. That a photo was asked for is kept before the camera opens; its bytes are read where they arrive
 * and are on the phone before anything is said.
 */
export function PhotoButtons({ stepId, wantedId = null, of }: PhotoButtonsProps) {
  const { db } = useBench();
  const { build } = useBuild();
  const { act } = useActs();
  const camera = useRef<HTMLInputElement>(null);
  const gallery = useRef<HTMLInputElement>(null);
  const [busy, setBusy] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);

  useEffect(() => {
    // React passes on no cancel of a file picker.
    const inputs = [camera.current, gallery.current];
    const cancelled = () => void clearDraft(db, ASKED_PHOTO_KEY);
    for (const input of inputs) input?.addEventListener('cancel', cancelled);
    return () => {
      for (const input of inputs) input?.removeEventListener('cancel', cancelled);
    };
  }, [db]);

  async function ask(input: HTMLInputElement | null) {
    setTrouble(null);
    const asked: AskedPhotoDraft = { buildId: build.id, stepId, wantedId, askedAt: db.clock() };
    const kept = await saveDraft(db, ASKED_PHOTO_KEY, JSON.stringify(asked));
    if (kept) setTrouble(kept.message);
    input?.click();
  }

  async function take(input: HTMLInputElement) {
    const file = input.files?.[0];
    if (!file) return;
    setTrouble(null);
    setBusy(true);
    try {
      const { preparePhoto } = await import('@/lib/device/photo');
      const prepared = await preparePhoto(file);
      if (!prepared.ok) {
        setTrouble(prepared.message);
        return;
      }
      const { ok: _, ...facts } = prepared;
      await act(of ? `Photo kept: ${of}` : 'Photo kept', (acts) =>
        acts.addPhoto(db, { buildId: build.id, stepId, wantedId, caption: '', ...facts }),
      );
    } catch (error) {
      console.error(error);
      setTrouble('The photo could not be read. It may still be in your gallery: choose it from there.');
    } finally {
      // The same picture may be chosen again after a failure.
      input.value = '';
      setBusy(false);
      // A picture came, and what became of it has been said: nothing is left to ask after.
      await clearDraft(db, ASKED_PHOTO_KEY);
    }
  }

  const files = {
    type: 'file',
    accept: 'image/*',
    className: 'sr-only',
    tabIndex: -1,
    'aria-hidden': true,
  } as const;
  return (
    <div className="grid gap-3">
      <div className="grid grid-cols-2 gap-6">
        <ActButton pending={busy} pendingLabel="Keeping it" onClick={() => void ask(camera.current)}>
          Camera
        </ActButton>
        <ActButton disabled={busy} onClick={() => void ask(gallery.current)}>
          From the gallery
        </ActButton>
      </div>
      <input
        {...files}
        ref={camera}
        capture="environment"
        aria-label={of ? `Take a photo of ${of}` : 'Take a photo'}
        onChange={(event) => void take(event.currentTarget)}
      />
      <input
        {...files}
        ref={gallery}
        aria-label={of ? `Choose a photo of ${of}` : 'Choose a photo'}
        onChange={(event) => void take(event.currentTarget)}
      />
      {trouble && (
        <Notice tone="danger" title="No photo was kept." live="alert">
          {trouble}
        </Notice>
      )}
    </div>
  );
}
