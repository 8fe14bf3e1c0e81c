'use client';
import { departuresOf, measurementsOf, notesOf, photosOf } from '@/lib/domain/build/views';
import type { BenchAddress } from '../shell/address';
import { BenchLink } from '../shell/bench-link';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { packWords } from '../builds/pack-words';

/** The other screens of a build, each with what it holds. */
export function MoreView() {
  const { build, state, plan } = useBuild();
  const buildId = build.id;
  const ways: { to: Partial<BenchAddress>; word: string; says: string }[] = [
    { to: { buildId, view: 'log' }, word: 'Build log', says: 'All that was done, by day' },
    { to: { buildId, view: 'cutting' }, word: 'Buy and cut', says: 'How much stock, and a diagram of each piece' },
    {
      to: { buildId, view: 'drawings' },
      word: 'Drawings',
      says:
        plan.attachments.length > 0 ? count(plan.attachments.length, 'file', 'files') : 'The piece from three sides',
    },
    { to: { buildId, view: 'photos' }, word: 'Photos', says: count(photosOf(state).length, 'photo', 'photos') },
    {
      to: { buildId, view: 'notes' },
      word: 'Notes and departures',
      says: `${count(notesOf(state).length, 'note', 'notes')}, ${count(departuresOf(state).length, 'departure', 'departures')}`,
    },
    {
      to: { buildId, view: 'sizes' },
      word: 'Measure',
      says: `${plan.keySizes.filter((size) => size.takeFromWork).length} sizes to take from the work; besides, ${measurementsOf(state).length} measured`,
    },
    { to: { buildId, view: 'close' }, word: 'Close down', says: 'The end of a session' },
    {
      to: { buildId, view: 'emergency' },
      word: 'Emergency card',
      says: 'Address, number, where the kit is; near misses',
    },
    { to: { buildId, view: 'sync' }, word: 'Sending', says: 'What is only on this phone' },
    { to: { buildId, view: 'settings' }, word: 'Settings', says: 'Units, light, text size, accounts' },
    { to: { view: 'builds' }, word: 'Builds on this phone', says: packWords(build) },
  ];
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`more ${buildId}`} over={build.name}>
          More
        </ViewHeading>
        <ul className="border-t-2 border-iron">
          {ways.map(({ to, word, says }) => (
            <li key={word} className="border-b border-line">
              <BenchLink to={to} className="grid min-h-[81px] content-center py-2 active:bg-line">
                <span className="font-figures text-[1.5rem] leading-tight font-semibold">{word}</span>
                <span className="text-[1.0625rem] text-soft">{says}</span>
              </BenchLink>
            </li>
          ))}
        </ul>
      </div>
    </BuildFrame>
  );
}

const count = (many: number, one: string, more: string) =>
  many === 0 ? `No ${more} yet` : `${many} ${many === 1 ? one : more}`;
