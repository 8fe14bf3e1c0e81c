'use client';
import { Button } from '@/components/ui/button';
import { goTo } from '../shell/address';
import { useBuild } from '../shell/build-context';

/** The plate of "what now": opens the step that comes first. */
export function HerePlate({ stepId, begun }: { stepId: string; begun: boolean }) {
  const { build, now } = useBuild();
  const why = now.ready[0]?.why;
  return (
    <div className="grid gap-2">
      <Button kind="plate" onClick={() => goTo({ buildId: build.id, view: 'step', stepId })}>
        {begun ? 'Go on' : 'Begin'}
      </Button>
      {why && <p className="text-[1.0625rem] text-soft">{why}.</p>}
    </div>
  );
}
