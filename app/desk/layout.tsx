import Link from 'next/link';
import type { ReactNode } from 'react';
import { DeskQueries } from '@/components/desk/desk-queries';
import { linkLook } from '@/components/ui/link-look';
import { Mark } from '@/components/ui/mark';

const places = [
  { href: '/desk', name: 'Builds' },
  { href: '/desk/plans', name: 'Plans' },
  { href: '/desk/account', name: 'Account' },
];

export default function DeskLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="border-b-2 border-iron">
        <div className="mx-auto flex max-w-5xl flex-wrap items-center justify-between gap-x-6 px-5 py-2 sm:px-8">
          <Link href="/" className="font-figures flex min-h-11 items-center gap-3 text-2xl font-semibold">
            <Mark />
            Holdfast
          </Link>
          <nav aria-label="Desk" className="flex flex-wrap gap-x-6">
            {places.map(({ href, name }) => (
              <Link key={href} href={href} className={linkLook.quiet}>
                {name}
              </Link>
            ))}
            {/* The bench is a page of its own that works with no signal: reached by a whole load. */}
            <a href="/bench" className={linkLook.quiet}>
              Bench
            </a>
          </nav>
        </div>
      </header>
      <main className="mx-auto w-full max-w-5xl grow px-5 py-8 sm:px-8">
        <DeskQueries>{children}</DeskQueries>
      </main>
    </div>
  );
}
