/** What the worker does with a request; decided here, without the plumbing, so that it can be tested. */
export type Decision =
  /** Straight to the network: nothing of it is ever kept. */
  | 'network'
  /** The bench's page from the precache, whatever its search parameters say. */
  | 'bench'
  /** A file of this version from the precache. */
  | 'precache'
  /** A page of the site or the desk: from the network, or a page that points to the bench. */
  | 'page';

export interface Asked {
  method: string;
  /** `navigate` for a page that a person opens. */
  mode: string;
  url: URL;
  origin: string;
}

/** API answers go to the network alone, and so does every request that changes something or is not ours. */
export function decide({ method, mode, url, origin }: Asked): Decision {
  if (method !== 'GET' || url.origin !== origin || url.pathname.startsWith('/api/')) return 'network';
  // A payload of the framework's router is no page: mixing the two in one cache breaks both.
  if (url.searchParams.has('_rsc')) return 'network';
  if (mode === 'navigate') return isBench(url.pathname) ? 'bench' : 'page';
  return 'precache';
}

/** The bench is one page; any address below it opens it. */
export function isBench(pathname: string): boolean {
  return pathname === '/bench' || pathname.startsWith('/bench/');
}
