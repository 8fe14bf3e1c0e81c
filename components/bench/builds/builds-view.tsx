'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { progressOf } from '@/lib/domain/build/progress';
import { getBuilds, getPlan } from '@/lib/store/queries/builds';
import type { BuildRow } from '@/lib/store/rows';
import { Button } from '@/components/ui/button';
import { useBench } from '../shell/bench-context';
import { Frame } from '../shell/frame';
import { goTo } from '../shell/address';
import { BenchLink } from '../shell/bench-link';
import { ViewHeading } from '../shell/view-heading';
import { InstallHint } from '../shell/install-hint';
import { OutsideFoot } from '../shell/outside-foot';
import { ProgressBar } from '../steps/progress-bar';
import { packWords } from './pack-words';
import { UpdatePrompt } from '@/components/sync/update-prompt';

/** Builds on this phone, last used first, and the way to bring one here. */
export function BuildsView() {
  const { db } = useBench();
  const builds = useLiveQuery(() => getBuilds(db), [db]);
  return (
    <Frame title="Holdfast" home={{ view: 'builds' }} foot={<OutsideFoot />} notices={<UpdatePrompt />}>
      <div className="bench-page">
        <ViewHeading focusKey="builds">Builds on this phone</ViewHeading>
        {builds?.length === 0 && (
          <p>
            Nothing yet. A build that you take to the bench is kept on this phone with its plan, cut list, timers and
            cautions, and needs no signal after that.
          </p>
        )}
        <ul className="grid gap-4">
          {builds?.map((build) => (
            <li key={build.id}>
              <BuildCard build={build} />
            </li>
          ))}
        </ul>
        {builds && (
          <Button
            kind={builds.length === 0 ? 'plate' : 'act'}
            className={builds.length === 0 ? '' : 'min-h-[81px]! text-[1.3125rem]!'}
            onClick={() => goTo({ view: 'take' })}
          >
            Take a build to the bench
          </Button>
        )}
        <InstallHint />
      </div>
    </Frame>
  );
}

function BuildCard({ build }: { build: BuildRow }) {
  const { db } = useBench();
  const plan = useLiveQuery(() => getPlan(db, build.contentHash), [db, build.contentHash]);
  const progress = plan && progressOf(plan, build.state, build.lastUsedAt);
  return (
    <BenchLink
      to={{ buildId: build.id }}
      className="grid min-h-[125px] content-center gap-2 rounded-plate border-2 border-iron bg-paper px-5 py-4 active:bg-line"
    >
      <span className="font-figures text-[1.875rem] leading-tight font-semibold">{build.name}</span>
      {progress && (
        <>
          <ProgressBar done={progress.stepsDone} skipped={progress.stepsSkipped} inAll={progress.stepsInAll} />
          <span className="font-figures text-[1.1875rem]">
            {progress.stepsDone} of {progress.stepsInAll} steps done
            {build.role === 'onlooker' ? ' · you look on' : ''}
          </span>
        </>
      )}
      <span className="text-[1rem] text-soft">{packWords(build)}</span>
    </BenchLink>
  );
}
