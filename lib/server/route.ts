import 'server-only';
import type { z } from 'zod';
import { readSession, type Account, type Session } from './auth/read-session';
import { env } from './env';
import { AppError } from './errors';
import { allowed, type Verdict } from './policies/verdict';
import { problemResponse } from './problem';
import { parseInput, searchValues } from './request/parse-input';
import { readBytes, readJson, refuseWrongType } from './request/read-body';
import { refuseForeign } from './request/same-origin';
import { toAppError } from './to-app-error';

const JSON_TYPES = ['application/json'] as const;
const IMAGE_TYPES = ['image/jpeg', 'image/png', 'image/webp', 'image/heic', 'image/heif'] as const;
const DEFAULT_JSON_BYTES = 1_000_000;
const DEFAULT_IMAGE_BYTES = 20_000_000;

type Schema = z.ZodType | undefined;
type Parsed<S extends Schema> = S extends z.ZodType ? z.output<S> : undefined;
type Auth = 'member' | 'anyone';

/** What a handler and its policy are given: everything parsed, nothing to be checked again. */
export interface RouteContext<A extends Auth, B extends Schema, P extends Schema, Q extends Schema> {
  /** Who asks; null only where anyone may. */
  account: A extends 'member' ? Account : Account | null;
  session: A extends 'member' ? Session : Session | null;
  params: Parsed<P>;
  query: Parsed<Q>;
  body: Parsed<B>;
  /** The raw body of a route of kind `bytes`; empty elsewhere. */
  bytes: Uint8Array<ArrayBuffer>;
  request: Request;
}

export interface RouteSpec<A extends Auth, B extends Schema, P extends Schema, Q extends Schema> {
  auth: A;
  /** What a request that changes something carries: `json` unless said. */
  kind?: 'json' | 'bytes';
  body?: B;
  params?: P;
  query?: Q;
  /** Largest body taken; 1 MB of JSON or 20 MB of bytes unless said. */
  maxBytes?: number;
  /** Media types taken by a route of kind `bytes`: raw images unless said. */
  mediaTypes?: readonly string[];
  /** Whether this person may do this; judged after parsing and before the handler. */
  policy?: (context: RouteContext<A, B, P, Q>) => Verdict | Promise<Verdict>;
}

type Values = Record<string, string | string[] | undefined>;
type RouteHandler = (request: Request, context: { params: Promise<Values> }) => Promise<Response>;

/**
 * Makes a route handler. In this order: proof that a changing request comes from our own pages, the kind of content,
 * who asks, parsing of path, query and body, the policy, then the handler. A value that the handler returns goes out as
 * JSON with status 200 (204 when there is none), a Response as it is; a failure as problem+json. Nothing may be cached,
 * unless the handler's own Response says how.
 */
export function route<
  A extends Auth,
  B extends Schema = undefined,
  P extends Schema = undefined,
  Q extends Schema = undefined,
>(spec: RouteSpec<A, B, P, Q>, handle: (context: RouteContext<A, B, P, Q>) => Promise<unknown>): RouteHandler {
  return async (request, { params }) => {
    try {
      const answer = await handle(await prepare(spec, request, await params));
      return answer instanceof Response ? uncached(answer) : uncached(toResponse(answer));
    } catch (error) {
      return problemResponse(toAppError(error, request));
    }
  };
}

async function prepare<A extends Auth, B extends Schema, P extends Schema, Q extends Schema>(
  spec: RouteSpec<A, B, P, Q>,
  request: Request,
  params: Values,
): Promise<RouteContext<A, B, P, Q>> {
  const takesBytes = spec.kind === 'bytes';
  const changes = request.method !== 'GET' && request.method !== 'HEAD';
  if (changes) {
    refuseForeign(request, env().NEXTAUTH_URL);
    refuseWrongType(request, takesBytes ? (spec.mediaTypes ?? IMAGE_TYPES) : JSON_TYPES);
  }
  const signedIn = await readSession(request.headers.get('cookie'));
  if (spec.auth === 'member' && !signedIn) {
    throw new AppError('sign-in-needed', 'You are not signed in, or this sign-in has ended. Sign in and try again.');
  }
  const context = {
    account: signedIn?.account ?? null,
    session: signedIn?.session ?? null,
    params: spec.params && parseInput(spec.params, params, 'malformed'),
    query: spec.query && parseInput(spec.query, searchValues(request.url), 'malformed'),
    body: changes && !takesBytes ? await parseBody(spec, request) : undefined,
    bytes: changes && takesBytes ? await readBytes(request, spec.maxBytes ?? DEFAULT_IMAGE_BYTES) : new Uint8Array(),
    request,
  } as RouteContext<A, B, P, Q>;
  const verdict = spec.policy ? await spec.policy(context) : allowed;
  if (!verdict.ok) throw new AppError(verdict.code, verdict.detail);
  return context;
}

async function parseBody(spec: { body?: Schema; maxBytes?: number }, request: Request): Promise<unknown> {
  if (!spec.body) return undefined;
  return parseInput(spec.body, await readJson(request, spec.maxBytes ?? DEFAULT_JSON_BYTES), 'invalid');
}

function toResponse(answer: unknown): Response {
  return answer === undefined ? new Response(null, { status: 204 }) : Response.json(answer);
}

function uncached(response: Response): Response {
  if (!response.headers.has('cache-control')) response.headers.set('cache-control', 'no-store');
  response.headers.set('x-content-type-options', 'nosniff');
  return response;
}
