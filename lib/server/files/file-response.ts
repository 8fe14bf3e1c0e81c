import 'server-only';
import type { StoredFile } from '@/models/stored-file';
import { AppError } from '../errors';
import { readFile } from './store-file';

/** The bytes of a stored file as an answer that a browser shows and never runs. */
export async function fileResponse(file: StoredFile | null): Promise<Response> {
  const content = file && (await readFile(file));
  if (!file || !content) throw new AppError('not-found', 'There is no such file, or it is not yours to see.');
  return new Response(new Uint8Array(content), {
    headers: {
      'content-type': file.mediaType,
      'content-length': String(content.byteLength),
      'content-disposition': file.mediaType.startsWith('image/') ? 'inline' : 'attachment',
      'content-security-policy': "default-src 'none'; sandbox",
    },
  });
}
