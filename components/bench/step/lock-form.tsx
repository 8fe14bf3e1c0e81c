'use client';
import { useState } from 'react';
import type { Lock } from '@/lib/domain/build/locks';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { CheckRow } from '../entry/check-row';
import { useDraft } from '../entry/use-draft';
import { lockKey } from './plate-of';

interface LockFormProps {
  /** Drafts of the reason are kept under this key. */
  draftKey: string;
  locks: readonly Lock[];
  onPass: (why: string) => void;
  onLeave: () => void;
}

/**
 * The way past locks. A lock of order asks why, and becomes a departure. A lock that protects a person or a tool has a
 * confirmation of its own that names the danger; all of them are needed.
 */
export function LockForm({ draftKey, locks, onPass, onLeave }: LockFormProps) {
  const why = useDraft(draftKey);
  const [confirmed, setConfirmed] = useState<ReadonlySet<string>>(new Set());
  const [asked, setAsked] = useState(false);
  const dangerous = locks.filter(({ protects }) => protects === 'person-or-tool');
  const unconfirmed = dangerous.filter((lock) => !confirmed.has(lockKey(lock)));
  const noReason = why.text.trim() === '';

  function toggle(key: string) {
    const next = new Set(confirmed);
    if (!next.delete(key)) next.add(key);
    setConfirmed(next);
  }

  function pass() {
    setAsked(true);
    if (noReason || unconfirmed.length > 0) return;
    const reason = why.text.trim();
    why.clear();
    onPass(reason);
  }

  return (
    <section
      aria-label="Go past what stands in the way"
      className="grid gap-4 rounded-plate border-2 border-iron bg-paper p-4"
    >
      <h2 className="text-[1.5rem]">Do it all the same?</h2>
      {dangerous.map((lock) => {
        const key = lockKey(lock);
        const missing = asked && !confirmed.has(key);
        return (
          <div key={key} className="grid gap-2 rounded-[3px] border-2 border-l-[12px] border-red px-3 py-3">
            <p>{lock.words}</p>
            <p className="font-semibold text-red">{lock.danger}</p>
            <CheckRow
              tone="red"
              checked={confirmed.has(key)}
              onChange={() => toggle(key)}
              invalid={missing}
              className="border-t border-line pt-2 font-semibold"
            >
              {CONFIRMATIONS[lock.lock]}
            </CheckRow>
            {missing && <p className="font-semibold text-red">This needs your word before you go on.</p>}
          </div>
        );
      })}
      {locks
        .filter(({ protects }) => protects === 'order')
        .map((lock) => (
          <p key={lockKey(lock)}>{lock.words}</p>
        ))}
      <Field
        label="Why"
        hint="It goes into the log as a departure from the plan."
        error={asked && noReason ? 'Say in a few words why, so that the log can answer for it.' : undefined}
      >
        <textarea rows={2} value={why.text} onChange={(event) => why.setText(event.target.value)} maxLength={1000} />
      </Field>
      {why.fault && <p className="font-semibold text-red">{why.fault}</p>}
      <div className="grid grid-cols-2 gap-6">
        <ActButton onClick={onLeave}>Leave it</ActButton>
        <ActButton kind={dangerous.length > 0 ? 'danger' : 'act'} onClick={pass}>
          Go past it
        </ActButton>
      </div>
    </section>
  );
}

const CONFIRMATIONS: Record<Lock['lock'], string> = {
  cure: 'I know that the glue may not hold yet, and I put no stress on the joint',
  metal: 'I know that metal may be in the cut’s way, and I have looked for it',
  clearance: 'I know that I am not cleared for this machine, and someone who is stands by',
  order: 'I know that the glue-up before this is not done, and I put no stress on the joint',
  'measure-first': 'I know that the size is not measured yet',
};
