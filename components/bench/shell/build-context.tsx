'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { createContext, useContext, useMemo, useState, type ReactNode } from 'react';
import type { BuildState } from '@/lib/domain/build/state';
import { measuredKeySizes } from '@/lib/domain/build/views';
import { whatNow, type WhatNow } from '@/lib/domain/build/what-now';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { resolveKeySizes, type KeySizeValues } from '@/lib/domain/plan/key-sizes';
import { resolveParts, type ResolvedPart } from '@/lib/domain/plan/resolve-parts';
import { getBuild, getPlan } from '@/lib/store/queries/builds';
import type { BuildRow } from '@/lib/store/rows';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useBench } from './bench-context';
import { BlankBench } from './blank-bench';
import { MissingBuild } from './missing-build';
import { takeWarm } from './warm-up';

export interface BuildContextValue {
  build: BuildRow;
  plan: PlanDocument;
  state: BuildState;
  /** Key sizes as measured, chosen, worked out or drawn. */
  values: KeySizeValues;
  /** Finished sizes by part id. */
  parts: ReadonlyMap<string, ResolvedPart>;
  now: WhatNow;
  /** Changes nothing at this build: an onlooker. */
  readOnly: boolean;
}

const BuildContext = createContext<BuildContextValue | null>(null);

export function useBuild(): BuildContextValue {
  const build = useContext(BuildContext);
  if (!build) throw new Error('useBuild is used outside <BuildProvider>');
  return build;
}

/** Locks open with time, so they are judged anew this often. */
const JUDGE_EVERY_MS = 15_000;

/** One build with its plan and all that follows from its state, straight from the phone's storage. */
export function BuildProvider({ buildId, children }: { buildId: string; children: ReactNode }) {
  const { db } = useBench();
  const [warm] = useState(() => takeWarm(db.accountId, buildId));
  const row = useLiveQuery(
    async () => ({ build: await getBuild(db, buildId) }),
    [db, buildId],
    warm ? { build: warm.build } : undefined,
  );
  const build = row?.build;
  const contentHash = build?.contentHash;
  const planRow = useLiveQuery(
    async () => (contentHash ? { contentHash, plan: await getPlan(db, contentHash) } : null),
    [db, contentHash],
    warm ? { contentHash: warm.build.contentHash, plan: warm.plan } : undefined,
  );
  const plan = planRow?.contentHash === contentHash ? planRow?.plan : undefined;
  const clock = useClock(JUDGE_EVERY_MS);
  const sizes = useMemo(() => (plan && build ? sizesOf(plan, build.state) : null), [plan, build]);
  const now = useMemo(
    () => (plan && build ? whatNow(plan, build.state, clock, { formatTime: (ms) => dayAndTime(ms, clock) }) : null),
    [plan, build, clock],
  );
  const value = useMemo(
    () =>
      build && plan && sizes && now
        ? { build, plan, state: build.state, ...sizes, now, readOnly: build.role === 'onlooker' }
        : null,
    [build, plan, sizes, now],
  );
  if (value) return <BuildContext.Provider value={value}>{children}</BuildContext.Provider>;
  const missing = (row && !build) || (build && planRow?.contentHash === contentHash && !plan);
  return missing ? <MissingBuild buildId={buildId} /> : <BlankBench />;
}

function sizesOf(plan: PlanDocument, state: BuildState) {
  const resolved = resolveKeySizes(plan, measuredKeySizes(state));
  // A plan that was checked on import has no circle and no unknown name; anything else is a broken promise.
  if (!resolved.ok) throw new Error(`key size ${resolved.keySizeId}: ${resolved.message}`);
  const parts = new Map(resolveParts(plan, resolved.values).map((part) => [part.part.id, part]));
  return { values: resolved.values, parts };
}
