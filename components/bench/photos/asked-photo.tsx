'use client';
import dynamic from 'next/dynamic';
import { useLiveQuery } from 'dexie-react-hooks';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { clearDraft } from '@/lib/store/mutations/save-draft';
import { getDraft } from '@/lib/store/queries/held';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { ASKED_PHOTO_KEY, readAsked } from './asked-draft';

// Seldom seen, so not part of what a cold opening loads.
const PhotoButtons = dynamic(() => import('./photo-buttons').then((m) => m.PhotoButtons));

/** After the page was killed behind the camera: says for which step a photo was asked and that none came. */
export function AskedPhoto() {
  const { db } = useBench();
  const { build, plan } = useBuild();
  const text = useLiveQuery(() => getDraft(db, ASKED_PHOTO_KEY), [db]);
  const asked = readAsked(text ?? '');
  // What was asked for since this page began is still under way.
  if (!asked || asked.buildId !== build.id || asked.askedAt > performance.timeOrigin) return null;
  const step = asked.stepId ? findStep(plan, asked.stepId) : undefined;
  return (
    <div className="grid gap-3">
      <Notice tone="wait" title="No photo came back.">
        Holdfast was closed while the camera was open
        {step ? `, at step ${stepNumber(plan, step.id)}, ${step.title}` : ''}. It may be in your gallery.
      </Notice>
      <PhotoButtons stepId={asked.stepId} wantedId={asked.wantedId} />
      <Button kind="quiet" className="justify-self-start" onClick={() => void clearDraft(db, ASKED_PHOTO_KEY)}>
        Leave it
      </Button>
    </div>
  );
}
