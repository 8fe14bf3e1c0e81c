import Link from 'next/link';
import type { ReactNode } from 'react';
import { OwedSignOut } from '@/components/account/owed-sign-out';
import { DeskNav } from '@/components/desk/desk-nav';
import { DeskQueries } from '@/components/desk/desk-queries';
import { Mark } from '@/components/ui/mark';

export default function DeskLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="border-b-2 border-iron">
        <div className="mx-auto flex max-w-5xl flex-wrap items-center justify-between gap-x-6 px-5 py-2 sm:px-8">
          <Link href="/" className="font-figures flex min-h-11 items-center gap-3 text-2xl font-semibold">
            <Mark />
            Holdfast
          </Link>
          <DeskNav />
        </div>
      </header>
      <OwedSignOut />
      <main className="mx-auto w-full max-w-5xl grow px-5 py-8 sm:px-8">
        <DeskQueries>{children}</DeskQueries>
      </main>
    </div>
  );
}
