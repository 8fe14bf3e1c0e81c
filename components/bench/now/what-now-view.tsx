'use client';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { TrueFractions } from '../entry/true-fractions';
import { minutesWords } from '../entry/time-words';
import { AskedPhoto } from '../photos/asked-photo';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { TimerBox } from '../timers/timer-box';
import { FinishedNotice } from './finished-notice';
import { GetOutList } from './get-out-list';
import { LockedNotice } from './locked-notice';
import { NowPlate } from './now-plate';
import { ReadyList } from './ready-list';
import { SessionLine } from './session-line';

/** Where I was, what is curing, what I can do now, what to get out. One thing is big: the step to do. */
export function WhatNowView() {
  const { build, plan, now } = useBuild();
  const here = now.here ? findStep(plan, now.here) : undefined;
  const stage = plan.stages.find(({ id }) => id === here?.stage)?.name;
  const why = now.ready[0]?.why;
  return (
    <BuildFrame layout="step">
      <main className="bench-now">
        <div className="bench-scroll">
          <div className="bench-page">
            <AskedPhoto />
            {now.timers.length > 0 && (
              <ul
                className="grid grid-cols-[repeat(auto-fit,minmax(10rem,1fr))] gap-3"
                aria-label="Curing and in clamps"
              >
                {now.timers.map((timer) => (
                  <li key={timer.timerId}>
                    <TimerBox timer={timer} />
                  </li>
                ))}
              </ul>
            )}
            {here ? (
              <div className="grid gap-1">
                <ViewHeading
                  focusKey={`now ${build.id}`}
                  over={`${stage} · step ${stepNumber(plan, here.id)} of ${plan.steps.length} · ${minutesWords(here.minutes)}`}
                >
                  <TrueFractions text={here.title} />
                </ViewHeading>
                {why && <p className="text-[1.0625rem] text-soft">{why}.</p>}
              </div>
            ) : (
              <>
                <ViewHeading focusKey={`now ${build.id}`} over={build.name}>
                  {now.finished ? 'Finished' : 'Nothing can be done just now'}
                </ViewHeading>
                {now.finished ? <FinishedNotice /> : <LockedNotice />}
              </>
            )}
            <SessionLine />
            {now.getOut && <GetOutList getOut={now.getOut} />}
            <ReadyList suggestions={now.ready.slice(1)} />
          </div>
        </div>
        <div className="now-act">
          <NowPlate />
        </div>
      </main>
    </BuildFrame>
  );
}
