'use client';
import { sessionsOf } from '@/lib/domain/build/views';
import { Button } from '@/components/ui/button';
import { clockTime, dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { goTo } from '../shell/address';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';

/** Longer than this and a session was left open by mistake, ms. */
const LEFT_OPEN_MS = 12 * 3_600_000;

/** The session: opened by one tap or by the first act; when it was left, what was to come first. */
export function SessionLine() {
  const { build, state, readOnly } = useBuild();
  const { act } = useActs();
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
  return (
    <div className="grid gap-2 border-y border-line py-3">
      {last?.closedAt && (
        <p className="text-[1.0625rem] text-soft">
          Closed down {dayAndTime(last.closedAt, clock)}.
          {last.firstNext && (
            <>
              {' '}
              You wanted first: <b className="text-iron">{last.firstNext}</b>.
            </>
          )}
        </p>
      )}
      <Button className="min-h-[81px]!" onClick={() => void act('Work began', () => Promise.resolve([]))}>
        Begin a session
      </Button>
      <p className="text-[1rem] text-soft">The first tick begins one by itself.</p>
    </div>
  );
}
