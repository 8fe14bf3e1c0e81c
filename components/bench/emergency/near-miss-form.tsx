'use client';
import { useState } from 'react';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { useDraft } from '../entry/use-draft';
import { loadActs } from '../shell/acts';
import { useAnnounce } from '../shell/announcer';
import { useBench } from '../shell/bench-context';

/** Writes down what nearly happened, in the build's log. */
export function NearMissForm({ buildId }: { buildId: string }) {
  const { db } = useBench();
  const announce = useAnnounce();
  const draftKey = `near-miss/${buildId}`;
  const draft = useDraft(draftKey);
  const [fault, setFault] = useState<string | null>(null);
  const [kept, setKept] = useState(false);

  async function keep() {
    const text = draft.text.trim();
    if (text === '') {
      setFault('Write what happened first.');
      return;
    }
    const { writeNote } = await loadActs();
    const saved = await writeNote(db, { buildId, stepId: null, text, about: 'near-miss', draftKey });
    if (!saved.ok) {
      setFault(saved.message);
      return;
    }
    draft.clear();
    setFault(null);
    setKept(true);
    announce('Near miss written down');
  }

  return (
    <section aria-labelledby="near-miss" className="grid gap-3 border-t-2 border-iron pt-4">
      <h2 id="near-miss" className="text-[1.5rem]">
        Something nearly happened
      </h2>
      <Field label="What, and what you will do otherwise" error={fault ?? draft.fault ?? undefined}>
        <textarea rows={3} value={draft.text} onChange={(event) => draft.setText(event.target.value)} />
      </Field>
      <ActButton onClick={() => void keep()}>Write it down</ActButton>
      {kept && draft.text === '' && (
        <Notice tone="done" live="status">
          It is in the build log.
        </Notice>
      )}
    </section>
  );
}
