import * as auth from '@/app/api/auth/[...nextauth]/route';
import { keepCookies, ownRequest, routeContext } from './request';

/** Calls a handler as one of our pages does and gives status, headers and what was answered. */
export async function call(
  handle: (request: Request, context: { params: Promise<Record<string, string | string[]>> }) => Promise<Response>,
  request: Request,
  params: Record<string, string | string[]> = {},
) {
  const response = await handle(request, routeContext(params));
  const text = await response.text();
  const body = text ? (JSON.parse(text) as Record<string, unknown>) : undefined;
  return { status: response.status, headers: response.headers, body, response };
}

interface SigningIn {
  email: string;
  password: string;
  cookie?: string;
  headers?: Record<string, string>;
}

/** Signs in as the form does: the csrf token first, then the credentials. Gives the cookies that the browser then has. */
export async function signInAs({ email, password, cookie = '', headers }: SigningIn) {
  const csrf = await call(auth.GET, ownRequest('/api/auth/csrf', { cookie }), { nextauth: ['csrf'] });
  const withCsrf = keepCookies(csrf.response, cookie);
  const path = '/api/auth/callback/credentials';
  const body = { email, password, csrfToken: csrf.body?.csrfToken };
  const answer = await call(auth.POST, ownRequest(path, { method: 'POST', body, cookie: withCsrf, headers }), {
    nextauth: ['callback', 'credentials'],
  });
  return { ...answer, cookie: keepCookies(answer.response, withCsrf) };
}

/** Signs out as the button does. */
export async function signOutWith(cookie: string) {
  const csrf = await call(auth.GET, ownRequest('/api/auth/csrf', { cookie }), { nextauth: ['csrf'] });
  const withCsrf = keepCookies(csrf.response, cookie);
  const body = { csrfToken: csrf.body?.csrfToken };
  const answer = await call(auth.POST, ownRequest('/api/auth/signout', { method: 'POST', body, cookie: withCsrf }), {
    nextauth: ['signout'],
  });
  return { ...answer, cookie: keepCookies(answer.response, withCsrf) };
}
