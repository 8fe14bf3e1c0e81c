import 'server-only';
import { decode } from 'next-auth/jwt';
import { z } from 'zod';
import { env } from '../env';

/** Longest life of a sign-in, however often it is used; also of its cookie. */
export const SESSION_MAX_AGE_S = 365 * 24 * 60 * 60;
/** A sign-in unused for so long ends. Long, because a phone may be without signal for weeks and still has work to send. */
export const SESSION_IDLE_S = 60 * 24 * 60 * 60;

/** What the cookie says: whose sign-in, and which. Whether it still stands is the session row's to say. */
export const claimsSchema = z.object({ sub: z.uuid(), sid: z.uuid() });
export type SessionClaims = z.infer<typeof claimsSchema>;

/** Cookies travel over https alone when the site's public address is https. */
export function isSecureSite(): boolean {
  return env().NEXTAUTH_URL.startsWith('https://');
}

/** Name of the sign-in cookie; the prefix makes browsers refuse it over plain http. */
export function sessionCookieName(): string {
  return isSecureSite() ? '__Host-holdfast.sign-in' : 'holdfast.sign-in';
}

/** What a Cookie header claims, or null when it carries no sign-in of ours, or one that was tampered with or has run out. */
export async function readClaims(cookieHeader: string | null): Promise<SessionClaims | null> {
  const token = readCookies(cookieHeader)[sessionCookieName()];
  if (token === undefined) return null;
  let payload;
  try {
    payload = await decode({ token, secret: env().NEXTAUTH_SECRET });
  } catch {
    // Encrypted with another secret, cut short, or expired: no sign-in, and not a fault of ours.
    return null;
  }
  const claims = claimsSchema.safeParse(payload);
  return claims.success ? claims.data : null;
}

/** The cookies of a Cookie header, by name; the first of a name counts. */
export function readCookies(header: string | null): Record<string, string> {
  const cookies: Record<string, string> = {};
  for (const part of header?.split(';') ?? []) {
    const equals = part.indexOf('=');
    const name = part.slice(0, Math.max(0, equals)).trim();
    if (name && !Object.hasOwn(cookies, name)) cookies[name] = decodeCookie(part.slice(equals + 1).trim());
  }
  return cookies;
}

function decodeCookie(value: string): string {
  try {
    return decodeURIComponent(value);
  } catch {
    return value;
  }
}
