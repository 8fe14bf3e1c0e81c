import { z } from 'zod';
import { callNextAuth, toResponse } from '@/lib/server/auth/call-next-auth';
import { signIn, signInRequest, signOut, signOutRequest } from '@/lib/server/auth/sign-in';
import { AppError } from '@/lib/server/errors';
import { parseInput } from '@/lib/server/request/parse-input';
import { route } from '@/lib/server/route';

const params = z.object({ nextauth: z.array(z.string().max(40)).min(1).max(2) });

/** What the sign-in library answers by itself: the csrf token, the session, and the way to our own pages. */
export const GET = route({ auth: 'anyone', params }, async ({ params: { nextauth }, request }) =>
  toResponse(await callNextAuth(request, nextauth)),
);

/** Signing in and out, behind the same proof of origin, kind and throttle as every other change. */
export const POST = route(
  { auth: 'anyone', params, body: z.record(z.string(), z.unknown()) },
  async ({ params: { nextauth }, body, request }) => {
    const action = nextauth.join('/');
    if (action === 'callback/credentials') return signIn(request, parseInput(signInRequest, body, 'invalid'));
    if (action === 'signout') return signOut(request, parseInput(signOutRequest, body, 'invalid'));
    throw new AppError('not-found', 'Nothing is done at this address.');
  },
);
