'use client';
import type { PlanStep } from '@/lib/domain/plan/document';
import { unlockSound } from '@/lib/device/alarm-sound';
import { Button } from '@/components/ui/button';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';
import { useShopTemperature } from './use-shop-temperature';

/** One tap when glue touches wood: from here the open time runs. */
export function FirstGluePlate({ step }: { step: PlanStep }) {
  const { build } = useBuild();
  const { act } = useActs();
  const { read } = useShopTemperature();

  function start() {
    // A browser allows sound only after a touch, so the tones are readied in this one.
    void unlockSound();
    void act(`First glue, ${step.glueUp?.name ?? step.title}`, (acts, db) =>
      acts.startTimer(db, {
        buildId: build.id,
        stepId: step.id,
        at: db.clock(),
        temperatureC: read.ok ? read.temperatureC : null,
      }),
    );
  }

  return (
    <Button kind="plate" className="text-[2.125rem]!" onClick={start}>
      First glue
    </Button>
  );
}
