'use client';
import { sessionsOf } from '@/lib/domain/build/views';
import { Button } from '@/components/ui/button';
import { clockTime, dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { goTo } from '../shell/address';
import { useBuild } from '../shell/build-context';

/** Longer than this and a session was left open by mistake, ms. */
const LEFT_OPEN_MS = 12 * 3_600_000;

/** The session that is open and the way to close it; after it, what was to come first. */
export function SessionLine() {
  const { build, state, readOnly } = useBuild();
  const clock = useClock(60_000);
  const sessions = sessionsOf(state);
  const open = sessions.findLast(({ openedAt, closedAt }) => openedAt && !closedAt);
  const last = sessions.findLast(({ closedAt }) => closedAt);
  if (readOnly) return null;
  if (open?.openedAt) {
    const leftOpen = clock - open.openedAt > LEFT_OPEN_MS;
    return (
      <div className="flex flex-wrap items-center justify-between gap-3 border-y border-line py-2">
        <p className="text-[1.0625rem] text-soft">
          {leftOpen
            ? `The session of ${dayAndTime(open.openedAt, clock)} was never closed.`
            : `At work since ${clockTime(open.openedAt)}.`}
        </p>
        <Button onClick={() => goTo({ buildId: build.id, view: 'close' })}>Close down</Button>
      </div>
    );
  }
  if (!last?.closedAt) return null;
  return (
    <p className="border-y border-line py-3 text-[1.0625rem] text-soft">
      Closed down {dayAndTime(last.closedAt, clock)}.
      {last.firstNext && (
        <>
          {' '}
          You wanted first: <b className="text-iron">{last.firstNext}</b>.
        </>
      )}
    </p>
  );
}
