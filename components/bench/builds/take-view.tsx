'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useEffect, useState } from 'react';
import { getBuilds } from '@/lib/store/queries/builds';
import { Button } from '@/components/ui/button';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import { useBench } from '../shell/bench-context';
import { Frame } from '../shell/frame';
import { OutsideFoot } from '../shell/outside-foot';
import { ViewHeading } from '../shell/view-heading';
import { askForBuilds, type BuildsAnswer } from './ask-for-builds';
import { TakeRow } from './take-row';

/** Builds on the server that this phone can take to the bench. */
export function TakeView() {
  const { db } = useBench();
  const here = useLiveQuery(() => getBuilds(db), [db]);
  const [answer, setAnswer] = useState<BuildsAnswer | null>(null);
  const [asks, setAsks] = useState(0);

  useEffect(() => {
    const leaving = new AbortController();
    void askForBuilds(leaving.signal).then((got) => {
      if (!leaving.signal.aborted) setAnswer(got);
    });
    return () => leaving.abort();
  }, [asks]);

  const askAgain = () => {
    setAnswer(null);
    setAsks(asks + 1);
  };

  return (
    <Frame title="Holdfast" home={{ view: 'builds' }} foot={<OutsideFoot />}>
      <div className="bench-page">
        <ViewHeading focusKey="take">Take a build to the bench</ViewHeading>
        <p>
          The pack with plan, cut list, timers, cautions and drawings is kept on this phone and checked piece by piece.
        </p>
        <div aria-live="polite" className="grid gap-5">
          {answer === null && <p className="text-soft">Asking what there is.</p>}
          {answer?.state === 'signed-out' && (
            <>
              <Notice tone="wait" title="Your sign-in has ended.">
                What is held here stays here. Sign in, then take the build.
              </Notice>
              <a className={linkLook.plate} href="/sign-in?return=%2Fbench%3Fview%3Dtake">
                Sign in
              </a>
            </>
          )}
          {answer?.state === 'no-signal' && (
            <>
              <Notice tone="wait" title="No signal.">
                {answer.message} Builds that are on this phone already work without.
              </Notice>
              <Button kind="plate" onClick={askAgain}>
                Ask again
              </Button>
            </>
          )}
          {answer?.state === 'builds' && answer.builds.length === 0 && (
            <>
              <p>You have no build yet. Choose a plan at the desk and start one; then it stands here.</p>
              <a className={linkLook.plate} href="/desk/plans">
                Choose a plan
              </a>
            </>
          )}
        </div>
        {answer?.state === 'builds' && (
          <ul className="grid gap-4">
            {answer.builds.map((build) => (
              <li key={build.id}>
                <TakeRow build={build} here={here?.find(({ id }) => id === build.id)} />
              </li>
            ))}
          </ul>
        )}
      </div>
    </Frame>
  );
}
