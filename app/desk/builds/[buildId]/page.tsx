import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { z } from 'zod';
import { BuildFacts } from '@/components/desk/build-facts';
import { BuildLog } from '@/components/desk/build-log';
import { Refresh } from '@/components/desk/refresh';
import { linkLook } from '@/components/ui/link-look';
import { requireSession } from '@/lib/server/auth/current-account';
import { mayOnBuild } from '@/lib/server/policies/build';
import { readBuildLog } from '@/lib/server/queries/build-log';
import { findBuild, listCrew, readCrewNames } from '@/lib/server/queries/builds';
import { roleOnBuild } from '@/lib/server/queries/crew';

export const metadata: Metadata = { title: 'Build' };

export default async function BuildPage({ params }: { params: Promise<{ buildId: string }> }) {
  const { buildId } = await params;
  const { account } = await requireSession(`/desk/builds/${buildId}`);
  if (!z.uuid().safeParse(buildId).success) notFound();
  const role = await roleOnBuild(buildId, account.id);
  const found = mayOnBuild('read', role).ok && (await findBuild(buildId));
  if (!found) notFound();
  const [entries, crew, names] = await Promise.all([readBuildLog(buildId), listCrew(buildId), readCrewNames(buildId)]);
  return (
    <div className="grid grid-cols-1 gap-8">
      <Refresh />
      <div className="flex flex-wrap items-end justify-between gap-4">
        <div>
          <p className="text-lg text-soft">{found.plan.title}</p>
          <h1 className="text-4xl">{found.build.name}</h1>
          <p className="text-lg">{crew.map(({ name, role: of }) => `${name}, ${of}`).join(' · ')}</p>
        </div>
        <a href={`/bench?view=take&build=${buildId}`} className={linkLook.act}>
          Take it to the bench
        </a>
      </div>
      <BuildFacts plan={found.plan} state={found.state} openedAt={found.readAt} />
      <section className="grid grid-cols-1 gap-4 border-t-2 border-iron pt-6">
        <h2 className="text-2xl">Build log</h2>
        {entries.length < found.build.lastPosition && (
          <p className="text-lg">
            The newest {entries.length} of {found.build.lastPosition} entries. The whole log is on the phones that have
            this build at the bench.
          </p>
        )}
        <BuildLog buildId={buildId} entries={entries} plan={found.plan} names={names} />
      </section>
    </div>
  );
}
