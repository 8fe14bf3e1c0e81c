import 'server-only';
import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { cache } from 'react';
import { readSession, type SignedIn } from './read-session';

/** Who looks at this page, for server components; null when nobody is signed in. Asked once a request. */
export const currentSession = cache(async (): Promise<SignedIn | null> => readSession((await headers()).get('cookie')));

/** The account behind this page, or null. */
export async function currentAccount() {
  return (await currentSession())?.account ?? null;
}

/** The same for a page that needs one: whoever is not signed in is sent to do so and comes back to `path`. */
export async function requireSession(path: string): Promise<SignedIn> {
  const signedIn = await currentSession();
  return signedIn ?? redirect(`/sign-in?return=${encodeURIComponent(path)}`);
}
