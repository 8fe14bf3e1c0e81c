import { isIP, isIPv6 } from 'node:net';

/** Carries the address from where it is known (the socket) to where it is wanted (a route handler). */
export const ADDRESS_HEADER = 'x-holdfast-address';

const watching = globalThis as typeof globalThis & { holdfastWatchesAddresses?: boolean };

/** Said by the watcher once it sets {@link ADDRESS_HEADER} on every request; until then the header is anyone's word. */
export function trustAddressHeader(): void {
  watching.holdfastWatchesAddresses = true;
}

/**
 * The network address that a request came from, for counting tries; `unknown` where this server does not see it, and then
 * all such requests share one count.
 */
export function clientAddress(request: Request): string {
  return (watching.holdfastWatchesAddresses && request.headers.get(ADDRESS_HEADER)) || 'unknown';
}

/**
 * Whose address counts, given the socket's and the X-Forwarded-For that came with it. Each trusted proxy has appended the
 * address that it saw, so with n of them the client is the n-th from the right; whatever stands further left is the
 * client's own word. With none, only the socket counts.
 *
 * An IPv6 address is cut to its first 64 bits, which one subscriber commonly has to themselves.
 */
export function addressBehind(
  socketAddress: string | undefined,
  forwardedFor: string | undefined,
  trustedProxies: number,
): string {
  const hops = (forwardedFor ?? '').split(',').map((hop) => hop.trim());
  const address = trustedProxies === 0 ? socketAddress : hops.at(-trustedProxies);
  const plain = (address ?? '').replace(/^::ffff:(?=\d+\.)/i, '').replace(/%.*$/, '');
  if (!isIP(plain)) return 'unknown';
  return isIPv6(plain) ? firstHalf(plain) : plain;
}

function firstHalf(address: string): string {
  const [head = '', tail] = address.toLowerCase().split('::');
  const left = head.split(':').filter(Boolean);
  const right = tail?.split(':').filter(Boolean) ?? [];
  const zeros = Array.from({ length: Math.max(0, 8 - left.length - right.length) }, () => '0');
  const groups = [...left, ...(tail === undefined ? [] : zeros), ...right].slice(0, 4);
  return `${groups.map((group) => Number.parseInt(group, 16).toString(16)).join(':')}::/64`;
}
