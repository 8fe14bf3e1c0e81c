'use client';
import { useSearchParams } from 'next/navigation';
import { useMemo } from 'react';

export const benchViews = [
  'builds',
  'take',
  'now',
  'step',
  'steps',
  'cuts',
  'timers',
  'photos',
  'notes',
  'sizes',
  'drawings',
  'cutting',
  'log',
  'close',
  'more',
  'sync',
  'settings',
  'emergency',
] as const;
export type BenchView = (typeof benchViews)[number];

/** Where in the bench a person is; the whole of it stands in the page's address. */
export interface BenchAddress {
  view: BenchView;
  buildId: string | null;
  stepId: string | null;
  /** What a view opens with: the timer, the photo or the form that was asked for. */
  open: string | null;
}

const WITHOUT_BUILD: readonly BenchView[] = ['builds', 'take', 'settings', 'emergency', 'sync'];

/** Reads an address. A build without a view is its "what now"; a view that needs a build but has none is the list of builds. */
export function readAddress(params: Pick<URLSearchParams, 'get'>): BenchAddress {
  // Typed or shortened addresses may come in capitals; ids are kept in small letters.
  const buildId = params.get('build')?.toLowerCase() || null;
  const asked = params.get('view');
  const known = benchViews.find((view) => view === asked);
  const stepId = params.get('step');
  const open = params.get('open');
  const fallback: BenchView = buildId ? 'now' : 'builds';
  let view = known ?? fallback;
  if (!buildId && !WITHOUT_BUILD.includes(view)) view = 'builds';
  if (view === 'step' && !stepId) view = 'steps';
  return { view, buildId, stepId: buildId ? stepId : null, open };
}

/** Address of a view, from the root of the site. */
export function benchPath({ view, buildId, stepId, open }: Partial<BenchAddress>): string {
  const params = new URLSearchParams();
  if (buildId) params.set('build', buildId);
  if (view && view !== (buildId ? 'now' : 'builds')) params.set('view', view);
  if (buildId && stepId) params.set('step', stepId);
  if (open) params.set('open', open);
  const query = params.toString();
  return query ? `/bench?${query}` : '/bench';
}

export function useBenchAddress(): BenchAddress {
  const params = useSearchParams();
  return useMemo(() => readAddress(params), [params]);
}

/** `heading`: the next view's heading takes the focus, so that it is read out. `stay`: the focus is left where it is. */
export type FocusAfter = 'heading' | 'stay';

let focusAfter: FocusAfter | null = null;

/** Goes to a view without asking the server for anything. */
export function goTo(address: Partial<BenchAddress>, how: { replace?: boolean; focus?: FocusAfter } = {}): void {
  focusAfter = how.focus ?? 'heading';
  const path = benchPath(address);
  if (how.replace) window.history.replaceState(null, '', path);
  else window.history.pushState(null, '', path);
}

/** What to do with the focus when a view has changed; null when the page has only just been opened. Asked once for each change. */
export function takeFocusAfter(): FocusAfter | null {
  const asked = focusAfter;
  focusAfter = 'heading';
  return asked;
}
