import 'server-only';
import type { NextAuthOptions, User } from 'next-auth';
import { decode } from 'next-auth/jwt';
import CredentialsProvider from 'next-auth/providers/credentials';
import { signInForm } from '@/lib/domain/account/forms';
import { env } from '../env';
import { log } from '../log';
import { checkCredentials } from './check-credentials';
import { findStanding } from './read-session';
import { claimsSchema, isSecureSite, readClaims, SESSION_MAX_AGE_S, sessionCookieName } from './session-cookie';
import { openSession, revokeSession } from './sessions';

interface SigningIn extends User {
  sessionId: string;
}

/**
 * How signing in works: an address and a password open a row in `sessions`, and the cookie carries the row's id in an
 * encrypted token. The token alone opens nothing; the row has to stand each time it is read.
 */
export function authOptions(): NextAuthOptions {
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: 'jwt', maxAge: SESSION_MAX_AGE_S },
    useSecureCookies: isSecureSite(),
    cookies: {
      sessionToken: {
        name: sessionCookieName(),
        options: { httpOnly: true, sameSite: 'lax', path: '/', secure: isSecureSite() },
      },
    },
    pages: { signIn: '/sign-in', signOut: '/desk/account', error: '/sign-in' },
    providers: [
      CredentialsProvider({
        credentials: { email: {}, password: {} },
        async authorize(credentials, request) {
          const form = signInForm.safeParse({ email: credentials?.email, password: credentials?.password });
          if (!form.success) return null;
          const accountId = await checkCredentials(form.data.email, form.data.password);
          if (accountId === null) return null;
          await endReplaced(header(request.headers, 'cookie'));
          const sessionId = await openSession(accountId, header(request.headers, 'user-agent') ?? '');
          const signingIn: SigningIn = { id: accountId, sessionId };
          return signingIn;
        },
      }),
    ],
    jwt: {
      async decode(params) {
        const claims = claimsSchema.safeParse(await decode(params));
        return claims.success && (await findStanding(claims.data)) ? claims.data : null;
      },
    },
    callbacks: {
      jwt: ({ token, user }) => (user ? { sub: user.id, sid: (user as SigningIn).sessionId } : token),
      async session({ session, token }) {
        const claims = claimsSchema.safeParse(token);
        const standing = claims.success ? await findStanding(claims.data) : null;
        return { expires: session.expires, user: { name: standing?.account.name, email: standing?.account.email } };
      },
    },
    logger: {
      error: (code, details) => log.error({ code, details }, 'the sign-in library met an error'),
      warn: (code) => log.warn({ code }, 'the sign-in library warns'),
      debug: () => undefined,
    },
  };
}

/** A sign-in that a new one takes the place of, in the same browser, would otherwise stay in its owner's list. */
async function endReplaced(cookieHeader: string | null): Promise<void> {
  const claims = await readClaims(cookieHeader);
  if (claims) await revokeSession(claims.sub, claims.sid);
}

function header(headers: Record<string, unknown> | undefined, name: string): string | null {
  const value = headers?.[name];
  return typeof value === 'string' ? value : null;
}
