'use client';
import { sessionsOf } from '@/lib/domain/build/views';
import { Button } from '@/components/ui/button';
import { useActs } from '../shell/act-context';
import { goTo } from '../shell/address';
import { useBuild } from '../shell/build-context';

/** The plate of "what now": opens the step that comes first, and the session where none is open. */
export function NowPlate() {
  const { build, state, now, readOnly } = useBuild();
  const { act } = useActs();
  const sessions = sessionsOf(state);
  const isOpen = sessions.some(({ openedAt, closedAt }) => openedAt && !closedAt);

  async function press() {
    if (now.here) {
      if (!isOpen && !readOnly) await act('Work began', () => Promise.resolve([]));
      goTo({ buildId: build.id, view: 'step', stepId: now.here });
    } else goTo({ buildId: build.id, view: now.finished ? 'log' : 'close' });
  }

  const begins = sessions.length === 0 ? 'Begin' : 'Begin today’s session';
  const word = readOnly ? 'Look at the step' : isOpen ? 'Go on' : begins;
  return (
    <Button kind="plate" className="text-[2.125rem]!" onClick={() => void press()}>
      {now.here ? word : now.finished ? 'Look back' : 'Close down for today'}
    </Button>
  );
}
