import Link from 'next/link';
import type { ReactNode } from 'react';
import { linkLook } from '@/components/ui/link-look';
import { Mark } from '@/components/ui/mark';

export default function SiteLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="border-b-2 border-iron">
        <nav
          aria-label="Holdfast"
          className="mx-auto flex max-w-5xl items-center justify-between gap-4 px-5 py-2 sm:px-8"
        >
          <Link href="/" className="font-figures flex min-h-11 items-center gap-3 text-2xl font-semibold">
            <Mark />
            Holdfast
          </Link>
          <span className="flex gap-6">
            <Link href="/desk" className={linkLook.quiet}>
              Desk
            </Link>
            {/* The bench is a page of its own that works with no signal: reached by a whole load. */}
            <a href="/bench" className={linkLook.quiet}>
              Bench
            </a>
          </span>
        </nav>
      </header>
      <main className="mx-auto w-full max-w-5xl grow px-5 py-8 sm:px-8 sm:py-12">{children}</main>
      <footer className="border-t border-line">
        <p className="mx-auto max-w-5xl px-5 py-5 text-base text-soft sm:px-8">
          Woodworking injures people. The manual of the tool, the label on the glue and finish, and the codes where you
          live come before anything written here.
        </p>
      </footer>
    </div>
  );
}
