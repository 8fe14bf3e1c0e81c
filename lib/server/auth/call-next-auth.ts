import 'server-only';
import NextAuth from 'next-auth';
import type { NextApiRequest, NextApiResponse } from 'next';
import { searchValues } from '../request/parse-input';
import { authOptions } from './auth-options';
import { readCookies } from './session-cookie';

/** What the sign-in library answers, before it is made into a Response. */
export interface AuthAnswer {
  status: number;
  headers: Map<string, string | string[]>;
  body: unknown;
}

/**
 * Asks the sign-in library, in the form it knows from API pages: its form for route handlers takes the cookies from the
 * framework's surroundings and not from the request that it is given.
 *
 * @param action  the path below /api/auth
 * @param body    fields of a POST
 */
export async function callNextAuth(
  request: Request,
  action: string[],
  body?: Record<string, string>,
): Promise<AuthAnswer> {
  const answer: AuthAnswer = { status: 200, headers: new Map(), body: undefined };
  const response = {
    status(code: number) {
      answer.status = code;
      return response;
    },
    getHeader: (name: string) => answer.headers.get(name.toLowerCase()),
    setHeader(name: string, value: string | string[]) {
      answer.headers.set(name.toLowerCase(), value);
      return response;
    },
    json: (value: unknown) => void (answer.body = value),
    send: (value: unknown) => void (answer.body = value),
    end: () => undefined,
  };
  const asked = {
    method: request.method,
    headers: Object.fromEntries(request.headers),
    cookies: readCookies(request.headers.get('cookie')),
    query: { ...searchValues(request.url), nextauth: action },
    body: body && { ...body, json: 'true', callbackUrl: '/desk' },
  };
  await NextAuth(asked as unknown as NextApiRequest, response as unknown as NextApiResponse, authOptions());
  return answer;
}

/** The library's answer as it is. */
export function toResponse({ status, headers, body }: AuthAnswer): Response {
  const out = setCookies(headers);
  for (const [name, value] of headers) if (typeof value === 'string') out.set(name, value);
  const isObject = typeof body === 'object' && body !== null;
  return new Response(isObject ? JSON.stringify(body) : (body as string | undefined), { status, headers: out });
}

/** Only the cookies of it. */
export function setCookies(headers: AuthAnswer['headers']): Headers {
  const out = new Headers();
  for (const cookie of [headers.get('set-cookie') ?? []].flat()) out.append('set-cookie', cookie);
  return out;
}
