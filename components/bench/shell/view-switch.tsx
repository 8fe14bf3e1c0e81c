'use client';
import dynamic from 'next/dynamic';
import { ActProvider } from './act-context';
import { useBenchAddress, type BenchAddress } from './address';
import { BlankBench } from './blank-bench';
import { BuildProvider } from './build-context';
import { BuildsView } from '../builds/builds-view';
import { TimerWatch } from '../timers/timer-watch';
import { WhatNowView } from '../now/what-now-view';

// What a cold opening shows first is in the first load; the others come when they are asked for. A step's address is the
// commonest deep one, so its code is asked for with the first load instead of after the build has been read.
const stepView = () => import('../step/step-view').then((m) => m.StepView);
if (typeof window !== 'undefined' && window.location.search.includes('view=step')) void stepView();

const loading = () => <BlankBench />;
const StepView = dynamic(stepView, { loading });
const TakeView = dynamic(() => import('../builds/take-view').then((m) => m.TakeView), { loading });
const StepsView = dynamic(() => import('../steps/steps-view').then((m) => m.StepsView), { loading });
const CutsView = dynamic(() => import('../cuts/cuts-view').then((m) => m.CutsView), { loading });
const TimersView = dynamic(() => import('../timers/timers-view').then((m) => m.TimersView), { loading });
const PhotosView = dynamic(() => import('../photos/photos-view').then((m) => m.PhotosView), { loading });
const NotesView = dynamic(() => import('../notes/notes-view').then((m) => m.NotesView), { loading });
const SizesView = dynamic(() => import('../sizes/sizes-view').then((m) => m.SizesView), { loading });
const DrawingsView = dynamic(() => import('../drawings/drawings-view').then((m) => m.DrawingsView), { loading });
const CuttingView = dynamic(() => import('../cutting/cutting-view').then((m) => m.CuttingView), { loading });
const LogView = dynamic(() => import('../log/log-view').then((m) => m.LogView), { loading });
const CloseDownView = dynamic(() => import('../close/close-down-view').then((m) => m.CloseDownView), { loading });
const MoreView = dynamic(() => import('../more/more-view').then((m) => m.MoreView), { loading });
const SettingsView = dynamic(() => import('../settings/settings-view').then((m) => m.SettingsView), { loading });
const EmergencyView = dynamic(() => import('../emergency/emergency-view').then((m) => m.EmergencyView), { loading });
const SyncView = dynamic(() => import('@/components/sync/sync-view').then((m) => m.SyncView), { loading });

/** The view that the address asks for. */
export function ViewSwitch() {
  const address = useBenchAddress();
  switch (address.view) {
    case 'builds':
      return <BuildsView />;
    case 'take':
      return <TakeView />;
    case 'settings':
      return <SettingsView />;
    case 'emergency':
      return <EmergencyView buildId={address.buildId} />;
    case 'sync':
      return <SyncView buildId={address.buildId} />;
    default:
      // One provider for all views of a build: going from step to step keeps the last act and reads nothing anew.
      return (
        <BuildProvider key={address.buildId} buildId={address.buildId!}>
          <ActProvider>
            <TimerWatch>
              <BuildView address={address} />
            </TimerWatch>
          </ActProvider>
        </BuildProvider>
      );
  }
}

function BuildView({ address }: { address: BenchAddress }) {
  switch (address.view) {
    case 'step':
      return <StepView stepId={address.stepId!} />;
    case 'steps':
      return <StepsView />;
    case 'cuts':
      return <CutsView />;
    case 'timers':
      return <TimersView />;
    case 'photos':
      return <PhotosView stepId={address.stepId} />;
    case 'notes':
      return <NotesView stepId={address.stepId} />;
    case 'sizes':
      return <SizesView stepId={address.stepId} />;
    case 'drawings':
      return <DrawingsView />;
    case 'cutting':
      return <CuttingView />;
    case 'log':
      return <LogView />;
    case 'close':
      return <CloseDownView />;
    case 'more':
      return <MoreView />;
    default:
      return <WhatNowView />;
  }
}
