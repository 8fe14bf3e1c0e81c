import type { Metadata } from 'next';
import Link from 'next/link';
import { BuildList } from '@/components/desk/build-list';
import { linkLook } from '@/components/ui/link-look';
import { requireSession } from '@/lib/server/auth/current-account';
import { listBuilds } from '@/lib/server/queries/builds';

export const metadata: Metadata = { title: 'Builds' };

export default async function BuildsPage() {
  const { account } = await requireSession('/desk');
  const builds = await listBuilds(account.id);
  return (
    <div className="grid gap-6">
      <div className="flex flex-wrap items-center justify-between gap-4">
        <h1 className="text-4xl">Builds</h1>
        {builds.length > 0 && (
          <Link href="/desk/plans" className={linkLook.act}>
            Start another
          </Link>
        )}
      </div>
      <BuildList initial={builds} />
    </div>
  );
}
