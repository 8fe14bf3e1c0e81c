'use client';
import type { AnchorHTMLAttributes, MouseEvent } from 'react';
import { benchPath, goTo, type BenchAddress } from './address';

interface BenchLinkProps extends Omit<AnchorHTMLAttributes<HTMLAnchorElement>, 'href'> {
  to: Partial<BenchAddress>;
}

/**
 * A link within the bench: a real address that can be opened in a tab of its own, followed here without asking the
 * server for anything.
 */
export function BenchLink({ to, onClick, ...rest }: BenchLinkProps) {
  function follow(event: MouseEvent<HTMLAnchorElement>) {
    onClick?.(event);
    const elsewhere = event.metaKey || event.ctrlKey || event.shiftKey || event.altKey || event.button !== 0;
    if (elsewhere || event.defaultPrevented) return;
    event.preventDefault();
    goTo(to);
  }
  return <a {...rest} href={benchPath(to)} onClick={follow} />;
}
