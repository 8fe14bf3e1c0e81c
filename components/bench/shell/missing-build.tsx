'use client';
import { Button } from '@/components/ui/button';
import { goTo } from './address';
import { Frame } from './frame';
import { ViewHeading } from './view-heading';

/** A bench address whose build is not on this phone: how to get it here. */
export function MissingBuild({ buildId }: { buildId: string }) {
  return (
    <Frame title="Holdfast" home={{ view: 'builds' }}>
      <div className="bench-page">
        <ViewHeading focusKey={`missing ${buildId}`}>This build is not on this phone</ViewHeading>
        <p>Take it to the bench where there is a signal; from then on it opens here without one.</p>
        <Button kind="plate" onClick={() => goTo({ view: 'take' })}>
          Take a build to the bench
        </Button>
        <Button onClick={() => goTo({ view: 'builds' })}>Builds on this phone</Button>
      </div>
    </Frame>
  );
}
