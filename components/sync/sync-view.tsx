'use client';
import { clockTime, dayAndTime, spanWords } from '@/components/bench/entry/time-words';
import { useClock } from '@/components/bench/entry/use-clock';
import { Frame } from '@/components/bench/shell/frame';
import { OutsideFoot } from '@/components/bench/shell/outside-foot';
import { ViewHeading } from '@/components/bench/shell/view-heading';
import { ActButton } from '@/components/bench/entry/act-button';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import type { SyncStatus } from '@/lib/store/rows';
import { RefusedTray } from './refused-tray';
import { useSyncAgent } from './sync-agent';
import { heldWords } from './sync-words';
import { UpdatePrompt } from './update-prompt';
import { useExportHeld } from './use-export-held';
import { useHeld } from './use-held';

/** Older than this and the person is asked to find a signal: the phone is the only place that has it, ms. */
const LONG_HELD_MS = 24 * 3_600_000;

const STATES: Record<SyncStatus['state'], string> = {
  idle: 'At rest',
  sending: 'Sending',
  waiting: 'Waits and tries again',
  'no-signal': 'No signal',
  'sign-in': 'Waits for you to sign in',
  'update-needed': 'Waits for the newer Holdfast',
};

/** All there is to know about sending: what is only here, how old, when it last went well or badly, what was refused. */
export function SyncView({ buildId }: { buildId: string | null }) {
  const { held, status } = useHeld();
  const { sendNow } = useSyncAgent();
  const exportHeld = useExportHeld();
  const clock = useClock(15_000);
  const count = held.entries + held.photos;
  const rows: [string, string][] = [
    ['Only on this phone', count === 0 ? 'nothing' : heldWords(held)],
    ...(held.oldestAt === null
      ? []
      : ([['The oldest', `${spanWords(clock - held.oldestAt)} old, from ${dayAndTime(held.oldestAt, clock)}`]] as [
          string,
          string,
        ][])),
    ['State', STATES[status.state]],
    ['Last sent', status.lastSuccessAt === null ? 'never from this phone' : dayAndTime(status.lastSuccessAt, clock)],
    ...(status.lastError ? ([['Last trouble', status.lastError]] as [string, string][]) : []),
    ...(status.nextTryAt && status.nextTryAt > clock
      ? ([['Next try', clockTime(status.nextTryAt)]] as [string, string][])
      : []),
  ];
  return (
    <Frame
      title="Holdfast"
      home={buildId ? { buildId } : { view: 'builds' }}
      foot={<OutsideFoot />}
      notices={<UpdatePrompt />}
    >
      <div className="bench-page">
        <ViewHeading focusKey="sync">{count === 0 ? 'All is sent' : `${count} held here`}</ViewHeading>
        {held.oldestAt !== null && clock - held.oldestAt > LONG_HELD_MS && (
          <Notice tone="wait" title="Find a signal today.">
            This phone is the only place that has these, and a lost phone loses them.
          </Notice>
        )}
        {status.state === 'sign-in' && (
          <a className={linkLook.plate} href="/sign-in?return=%2Fbench%3Fview%3Dsync">
            Sign in to send
          </a>
        )}
        <dl className="grid grid-cols-[auto_1fr] gap-x-4 border-t-2 border-iron">
          {rows.map(([name, says]) => (
            <div key={name} className="col-span-2 grid grid-cols-subgrid border-b border-line py-2.5">
              <dt className="font-figures text-soft">{name}</dt>
              <dd>{says}</dd>
            </div>
          ))}
        </dl>
        <div className="grid grid-cols-2 gap-6">
          <ActButton pending={status.state === 'sending'} pendingLabel="Sending" onClick={() => void sendNow()}>
            Send now
          </ActButton>
          <ActButton disabled={count + held.refused + held.refusedPhotos === 0} onClick={() => void exportHeld()}>
            Save as a file
          </ActButton>
        </div>
        <RefusedTray />
      </div>
    </Frame>
  );
}
