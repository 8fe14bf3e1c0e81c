'use client';
import { Button } from '@/components/ui/button';
import { goTo } from '../shell/address';
import { useBuild } from '../shell/build-context';

/** Plain words under the plate: along the rule, and what can be kept with the step. */
export function StepFoot({ stepId }: { stepId: string }) {
  const { build, plan } = useBuild();
  const index = plan.steps.findIndex(({ id }) => id === stepId);
  const before = plan.steps[index - 1]?.id;
  const next = plan.steps[index + 1]?.id;
  const to = (view: 'photos' | 'notes' | 'sizes') => () => goTo({ buildId: build.id, view, stepId });
  const step = (id: string | undefined) => () => id && goTo({ buildId: build.id, view: 'step', stepId: id });
  return (
    <nav className="bench-foot" aria-label="This step">
      <Button kind="plain" disabled={!before} onClick={step(before)}>
        Before
      </Button>
      <Button kind="plain" onClick={to('photos')}>
        Photo
      </Button>
      <Button kind="plain" onClick={to('notes')}>
        Note
      </Button>
      <Button kind="plain" onClick={to('sizes')}>
        Measure
      </Button>
      <Button kind="plain" disabled={!next} onClick={step(next)}>
        Next
      </Button>
    </nav>
  );
}
