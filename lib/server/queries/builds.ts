import 'server-only';
import { emptyState } from '@/lib/domain/build/fold';
import { progressOf, type Progress } from '@/lib/domain/build/progress';
import type { BuildState } from '@/lib/domain/build/state';
import type { PlanDocument } from '@/lib/domain/plan/document';
import type { Build } from '@/models/build';
import type { PlanRevision } from '@/models/plan-revision';
import { db } from '../db';
import type { CrewRole } from '../policies/build';

export interface BuildRow {
  id: string;
  name: string;
  planTitle: string;
  role: CrewRole;
  startedAt: string;
  /** Receipt of the newest entry, or null before the first. */
  lastEntryAt: string | null;
  entries: number;
  progress: Progress;
}

export interface BuildDetail {
  build: Build;
  revision: PlanRevision;
  plan: PlanDocument;
  state: BuildState;
  /** When it was read, ms: the clock by which the page is first drawn. */
  readAt: number;
}

/** Builds on whose crew a person is, newest activity first. */
export async function listBuilds(accountId: string, now = Date.now()): Promise<BuildRow[]> {
  const { CrewMember, Build } = db().models;
  const memberships = await CrewMember.findAll({ where: { accountId, removedAt: null } });
  const roles = new Map(memberships.map(({ buildId, role }) => [buildId, role]));
  const builds = await Build.findAll({ where: { id: [...roles.keys()] } });
  const rows = await Promise.all(
    builds.map(async (build): Promise<BuildRow> => {
      const [detail, lastEntryAt] = await Promise.all([readDetail(build), readLastEntryAt(build)]);
      return {
        id: build.id,
        name: build.name,
        planTitle: detail.plan.title,
        role: roles.get(build.id)!,
        startedAt: build.startedAt.toISOString(),
        lastEntryAt,
        entries: build.lastPosition,
        progress: progressOf(detail.plan, detail.state, now),
      };
    }),
  );
  return rows.sort((a, b) => (b.lastEntryAt ?? b.startedAt).localeCompare(a.lastEntryAt ?? a.startedAt));
}

/** State of a build without entries, in plain objects as a stored snapshot has them: pages pass on nothing else. */
const nothingYet = (): BuildState => structuredClone(emptyState());

/** A build with its plan and folded state, or null. Who may see it is the caller's to ask. */
export async function findBuild(buildId: string): Promise<BuildDetail | null> {
  const build = await db().models.Build.findByPk(buildId);
  return build && readDetail(build);
}

async function readDetail(build: Build): Promise<BuildDetail> {
  const { PlanRevision, Snapshot } = db().models;
  const [revision, snapshot] = await Promise.all([
    PlanRevision.findByPk(build.planRevisionId, { rejectOnEmpty: true }),
    Snapshot.findByPk(build.id),
  ]);
  return { build, revision, plan: revision.document, state: snapshot?.state ?? nothingYet(), readAt: Date.now() };
}

async function readLastEntryAt(build: Build): Promise<string | null> {
  if (build.lastPosition === 0) return null;
  const row = await db().models.LogEntryRow.findOne({ where: { buildId: build.id, position: build.lastPosition } });
  return row?.receivedAt.toISOString() ?? null;
}

const places: readonly CrewRole[] = ['owner', 'helper', 'onlooker'];

/** Crew of a build with names, present members only: the owner, then helpers, then onlookers, each as they joined. */
export async function listCrew(buildId: string): Promise<{ accountId: string; name: string; role: CrewRole }[]> {
  const { CrewMember } = db().models;
  const [members, names] = await Promise.all([
    CrewMember.findAll({ where: { buildId, removedAt: null }, order: [['joinedAt', 'ASC']] }),
    readCrewNames(buildId),
  ]);
  return members
    .sort((a, b) => places.indexOf(a.role) - places.indexOf(b.role))
    .map(({ accountId, role }) => ({ accountId, role, name: names[accountId]! }));
}

/** Names of everyone who is or was of a build's crew, by account: what a removed member did keeps their name. */
export async function readCrewNames(buildId: string): Promise<Record<string, string>> {
  const { CrewMember, Account } = db().models;
  const members = await CrewMember.findAll({ where: { buildId }, attributes: ['accountId'] });
  const accounts = await Account.findAll({ where: { id: members.map(({ accountId }) => accountId) } });
  return Object.fromEntries(accounts.map(({ id, name }) => [id, name]));
}
