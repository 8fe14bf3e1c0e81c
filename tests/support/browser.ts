import { vi } from 'vitest';

/** A navigator with these parts and the rest of the real one; a part that is undefined is absent. */
export function withNavigator(parts: Record<string, unknown>): void {
  const proxied = new Proxy(navigator, {
    get: (target, key) => (key in parts ? parts[key as string] : (target as never)[key]),
    has: (target, key) => (key in parts ? parts[key as string] !== undefined : key in target),
  });
  vi.stubGlobal('navigator', proxied);
}
