'use client';
import { useState } from 'react';
import { closeDown } from '@/lib/domain/build/close-down';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { CheckRow } from '../entry/check-row';
import { clockTime, dayAndTime, spanWords } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useDraft } from '../entry/use-draft';
import { goTo } from '../shell/address';
import { useActs } from '../shell/act-context';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';

/** Most minutes that one session keeps, a whole day. */
const MOST_MINUTES = 1_440;

/** The end of a session: one tap each for what can hurt or spoil, what stays in clamps, the hours, what comes first next. */
export function CloseDownView() {
  const { build, plan, state, readOnly } = useBuild();
  const { act } = useActs();
  const clock = useClock(30_000);
  const { items, curing, firstNext, session, minutes } = closeDown(plan, state, clock);
  const key = session?.sessionId ?? 'none';
  const seen = useDraft(`seen-to/${key}`);
  const next = useDraft(`first-next/${key}`);
  const worked = useDraft(`minutes/${key}`);
  const [asked, setAsked] = useState(false);
  const seenTo = new Set(seen.text.split('\n').filter(Boolean));
  const typed = worked.text.trim() === '' ? minutes : Number(worked.text);
  const badMinutes = !Number.isInteger(typed) || typed < 0 || typed > MOST_MINUTES;

  function see(id: string) {
    const after = new Set(seenTo);
    if (!after.delete(id)) after.add(id);
    seen.setText([...after].join('\n'));
  }

  async function close() {
    setAsked(true);
    if (!session || badMinutes) return;
    const saved = await act(`Closed down after ${spanWords(typed * 60_000)}`, (acts, db) =>
      acts.closeSession(db, {
        buildId: build.id,
        sessionId: session.sessionId,
        at: db.clock(),
        minutes: Math.min(typed, MOST_MINUTES),
        firstNext: (next.text.trim() || firstNext).slice(0, 500),
        seenTo: [...seenTo],
      }),
    );
    if (!saved) return;
    seen.clear();
    next.clear();
    worked.clear();
    goTo({ buildId: build.id });
  }

  const open = items.filter(({ id, level }) => level === 'danger' && !seenTo.has(id)).length;
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading
          focusKey={`close ${build.id}`}
          over={session ? `At work since ${clockTime(session.openedAt)}` : build.name}
        >
          Close down
        </ViewHeading>
        {curing.length > 0 && (
          <ul className="grid gap-2 rounded-plate border-2 border-amber bg-amber-ground px-4 py-3 text-on-amber">
            {curing.map(({ timerId, words, earliest, latest }) => (
              <li key={timerId}>
                <b className="font-figures text-[1.25rem] font-semibold">{words}</b>{' '}
                {earliest !== null && latest !== null
                  ? `${dayAndTime(earliest, clock)} to ${dayAndTime(latest, clock)}`
                  : 'till the label says'}
              </li>
            ))}
          </ul>
        )}
        <ul className="grid gap-4" aria-label="See to these">
          {items.map(({ id, level, words }) => (
            <li key={id}>
              <CheckRow
                tone="green"
                checked={seenTo.has(id)}
                onChange={() => see(id)}
                className={`rounded-[3px] border-2 bg-paper px-4 py-3 ${
                  level === 'danger' && !seenTo.has(id) ? 'border-l-[12px] border-red' : 'border-iron'
                }`}
              >
                <span className={seenTo.has(id) ? 'text-soft' : ''}>{words}</span>
              </CheckRow>
            </li>
          ))}
        </ul>
        {session && !readOnly ? (
          <>
            <Field label="First next time" hint="What you want to start with. Empty takes what is shown.">
              <input
                maxLength={500}
                placeholder={firstNext}
                value={next.text}
                onChange={(event) => next.setText(event.target.value)}
              />
            </Field>
            <Field
              label="Minutes worked"
              hint={`From the clock: ${spanWords(minutes * 60_000)}. Change it when you had a break.`}
              error={asked && badMinutes ? `A whole number of minutes from 0 to ${MOST_MINUTES}.` : undefined}
            >
              <input
                inputMode="numeric"
                className="max-w-40"
                placeholder={String(Math.min(minutes, MOST_MINUTES))}
                value={worked.text}
                onChange={(event) => worked.setText(event.target.value)}
              />
            </Field>
            {open > 0 && (
              <p className="font-semibold text-red">
                {open === 1 ? '1 thing that can hurt is' : `${open} things that can hurt are`} not seen to yet.
              </p>
            )}
            <Button kind="plate" onClick={() => void close()}>
              Close down
            </Button>
          </>
        ) : (
          <Notice tone="info">No session is open, so there are no hours to keep. The list holds all the same.</Notice>
        )}
      </div>
    </BuildFrame>
  );
}
