import 'server-only';
import { progressOf, type Progress } from '@/lib/domain/build/progress';
import { AppError } from '../errors';
import { findBuild, listCrew } from '../queries/builds';
import { roleOnBuild } from '../queries/crew';
import type { CrewRole } from '../policies/build';

export interface BuildPresented {
  id: string;
  name: string;
  planTitle: string;
  contentHash: string;
  role: CrewRole | null;
  startedAt: string;
  closedAt: string | null;
  entries: number;
  progress: Progress;
  crew: { accountId: string; name: string; role: CrewRole }[];
}

/** A build as its crew may see it. */
export async function presentBuild(buildId: string, accountId: string, now: number): Promise<BuildPresented> {
  const found = await findBuild(buildId);
  if (!found) throw new AppError('not-found', 'There is no such build, or you are not of its crew.');
  const { build, revision, plan, state } = found;
  const [crew, role] = await Promise.all([listCrew(buildId), roleOnBuild(buildId, accountId)]);
  return {
    id: build.id,
    name: build.name,
    planTitle: plan.title,
    contentHash: revision.contentHash,
    role,
    startedAt: build.startedAt.toISOString(),
    closedAt: build.closedAt?.toISOString() ?? null,
    entries: build.lastPosition,
    progress: progressOf(plan, state, now),
    crew,
  };
}
