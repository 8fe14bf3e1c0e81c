'use client';
import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { linkLook } from '@/components/ui/link-look';

const places = [
  { href: '/desk', name: 'Builds', holds: /^\/desk(\/builds\/.*)?$/ },
  { href: '/desk/plans', name: 'Plans', holds: /^\/desk\/plans/ },
  { href: '/desk/account', name: 'Account', holds: /^\/desk\/account/ },
];

/** The ways of the desk; where one is stands in iron, without its line. */
export function DeskNav() {
  const path = usePathname();
  return (
    <nav aria-label="Desk" className="flex flex-wrap gap-x-6">
      {places.map(({ href, name, holds }) => (
        <Link
          key={href}
          href={href}
          aria-current={holds.test(path) ? 'page' : undefined}
          className={`${linkLook.quiet} aria-[current]:font-semibold aria-[current]:text-iron aria-[current]:no-underline`}
        >
          {name}
        </Link>
      ))}
      {/* The bench is a page of its own that works with no signal: reached by a whole load. */}
      <a href="/bench" className={linkLook.quiet}>
        Bench
      </a>
    </nav>
  );
}
