import { packManifestSchema, type PackFile, type PackManifest } from '../domain/build/wire';
import { readPlan } from '../domain/plan/read-plan';
import type { AccountDatabase } from '../store/database';
import { savePack } from '../store/mutations/save-pack';
import { sha256Hex } from './sha256';

export interface PackProgress {
  doneBytes: number;
  allBytes: number;
  /** Title of the file under way. */
  file: string;
}

export type PackResult =
  | { ok: true; manifest: PackManifest }
  | { ok: false; code: 'no-signal' | 'sign-in' | 'not-there' | 'broken' | 'full' | 'other-account'; message: string };

interface PackDeps {
  db: AccountDatabase;
  buildId: string;
  fetch: (input: string) => Promise<Response>;
  caches: Pick<CacheStorage, 'open'>;
  onProgress?: (progress: PackProgress) => void;
}

/** The account's own cache of pack files; emptied at sign-out. */
export const packCacheName = (accountId: string) => `holdfast-pack-${accountId}`;

/** A file of a build's pack as it lies on this phone, or null where it does not: not taken yet, or cleared away. */
export async function packFile(
  caches: Pick<CacheStorage, 'open'>,
  { accountId, buildId, sha256 }: { accountId: string; buildId: string; sha256: string },
): Promise<Blob | null> {
  const cache = await caches.open(packCacheName(accountId));
  const kept = await cache.match(`/api/builds/${buildId}/pack/files/${sha256}`);
  return kept ? kept.blob() : null;
}

/**
 * Downloads all that a build needs with no signal, verifies each file by its hash, and makes the build ready in one
 * write. Nothing is ready half: on any failure what was ready before stays as it was.
 */
export async function takeToBench({ db, buildId, fetch, caches, onProgress }: PackDeps): Promise<PackResult> {
  const asked = await ask(fetch, `/api/builds/${buildId}/pack`);
  if (!asked.ok) return asked;
  const body = await bodyOf(asked.response);
  if (!body.ok) return body;
  const manifest = packManifestSchema.safeParse(jsonOf(body.bytes));
  if (!manifest.success) return foreign;
  const { data } = manifest;
  if (data.accountId !== db.accountId) {
    return {
      ok: false,
      code: 'other-account',
      message: 'Another account is signed in here. Sign in with yours, then try again.',
    };
  }
  const cache = await caches.open(packCacheName(db.accountId));
  let planText = '';
  let doneBytes = 0;
  for (const file of data.files) {
    onProgress?.({ doneBytes, allBytes: data.bytes, file: file.title });
    const got = await bytesOf(file, fetch, cache);
    if (!got.ok) return got;
    if (file.kind === 'plan') planText = new TextDecoder().decode(got.bytes);
    doneBytes += file.bytes;
  }
  onProgress?.({ doneBytes, allBytes: data.bytes, file: '' });
  const read = readPlan(planText);
  if (!read.ok)
    return {
      ok: false,
      code: 'broken',
      message: 'The plan in the pack cannot be read by this version of Holdfast. Update it, then try again.',
    };
  const notSaved = await savePack(db, data, read.plan);
  if (notSaved) return { ok: false, code: 'full', message: notSaved.message };
  return { ok: true, manifest: data };
}

const foreign = {
  ok: false,
  code: 'no-signal',
  message: 'What answered is not Holdfast’s server. A Wi-Fi sign-in page may be in the way.',
} as const;

const noSignal = {
  ok: false,
  code: 'no-signal',
  message: 'No signal, or the server cannot be reached. Try again where there is one.',
} as const;

/** Whole body of an answer; the signal may go while it comes. */
async function bodyOf(
  response: Response,
): Promise<{ ok: true; bytes: ArrayBuffer } | Exclude<PackResult, { ok: true }>> {
  try {
    return { ok: true, bytes: await response.arrayBuffer() };
  } catch {
    return noSignal;
  }
}

function jsonOf(bytes: ArrayBuffer): unknown {
  try {
    return JSON.parse(new TextDecoder().decode(bytes));
  } catch {
    // No JSON at all: the schema refuses it.
    return null;
  }
}

type Asked = { ok: true; response: Response } | Exclude<PackResult, { ok: true }>;

async function ask(fetch: PackDeps['fetch'], url: string): Promise<Asked> {
  let response: Response;
  try {
    response = await fetch(url);
  } catch {
    return noSignal;
  }
  // Our own addresses never lead elsewhere; a Wi-Fi's do.
  if (response.redirected) return foreign;
  if (response.ok) return { ok: true, response };
  if (response.status === 401)
    return { ok: false, code: 'sign-in', message: 'Your sign-in has ended. Sign in, then take it to the bench.' };
  if (response.status === 404)
    return { ok: false, code: 'not-there', message: 'This build is not there any more, or you are not of its crew.' };
  return {
    ok: false,
    code: 'no-signal',
    message: `The server could not be understood (${response.status}). Try again in a minute.`,
  };
}

async function bytesOf(
  file: PackFile,
  fetch: PackDeps['fetch'],
  cache: Cache,
): Promise<{ ok: true; bytes: ArrayBuffer } | Exclude<PackResult, { ok: true }>> {
  const kept = await cache.match(file.url);
  if (kept) {
    const bytes = await kept.arrayBuffer();
    if ((await sha256Hex(bytes)) === file.sha256) return { ok: true, bytes };
  }
  const asked = await ask(fetch, file.url);
  if (!asked.ok) return asked;
  const body = await bodyOf(asked.response);
  if (!body.ok) return body;
  const { bytes } = body;
  if ((await sha256Hex(bytes)) !== file.sha256) {
    // No file of a pack is a web page.
    if (asked.response.headers.get('content-type')?.includes('html')) return foreign;
    return { ok: false, code: 'broken', message: `${file.title} changed on its way here. Try again.` };
  }
  try {
    await cache.put(file.url, new Response(bytes, { headers: { 'content-type': file.mediaType } }));
  } catch (error) {
    if (!(error instanceof DOMException) || error.name !== 'QuotaExceededError') throw error;
    return { ok: false, code: 'full', message: 'This phone’s storage is full. Free some space, then try again.' };
  }
  return { ok: true, bytes };
}
