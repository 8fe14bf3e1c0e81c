import 'server-only';
import type { StoredFile } from '@/models/stored-file';
import { AppError } from '../errors';
import { keptResponse } from './kept-response';
import { readFile } from './store-file';

/** The bytes of a stored file as an answer that a browser shows and never runs. */
export async function fileResponse(request: Request, file: StoredFile | null): Promise<Response> {
  if (!file) throw new AppError('not-found', 'There is no such file, or it is not yours to see.');
  const headers = {
    'content-type': file.mediaType,
    'content-length': String(file.bytes),
    'content-disposition': file.mediaType.startsWith('image/') ? 'inline' : 'attachment',
    'content-security-policy': "default-src 'none'; sandbox",
  };
  return keptResponse(request, file.sha256, headers, async () => new Uint8Array(await readFile(file)));
}
