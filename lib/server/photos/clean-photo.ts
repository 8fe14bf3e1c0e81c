import 'server-only';
import sharp from 'sharp';
import { AppError } from '../errors';
import { imageKind } from '@/lib/domain/build/image-kind';

const MAX_PIXELS = 60_000_000;
const MAX_SIDE = 4_096;

export interface CleanPhoto {
  content: Buffer;
  mediaType: 'image/jpeg';
  width: number;
  height: number;
}

/**
 * A photo as it may be kept and shown: turned upright, written anew without any metadata (position, camera, time), at
 * most 4096 px on its longer side.
 *
 * @throws AppError `wrong-type` for what is no picture or cannot be read, `too-large` past 60 million pixels
 */
export async function cleanPhoto(bytes: Uint8Array): Promise<CleanPhoto> {
  const kind = imageKind(bytes);
  if (kind === null) throw new AppError('wrong-type', 'This is not a photo: send a JPEG, PNG or WebP picture.');
  if (kind === 'image/heic') {
    throw new AppError(
      'wrong-type',
      'HEIC pictures cannot be read here. It stays on the phone; take it again as JPEG to send it.',
    );
  }
  try {
    const { data, info } = await sharp(bytes, { limitInputPixels: MAX_PIXELS, failOn: 'error' })
      .rotate()
      .resize({ width: MAX_SIDE, height: MAX_SIDE, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .jpeg({ quality: 84, mozjpeg: false })
      .toBuffer({ resolveWithObject: true });
    return { content: data, mediaType: 'image/jpeg', width: info.width, height: info.height };
  } catch (error) {
    if (error instanceof Error && /pixel limit/i.test(error.message)) {
      throw new AppError('too-large', 'The picture has more than 60 million points. Send a smaller one.');
    }
    throw new AppError('wrong-type', 'The picture is damaged and cannot be read. Take it again, or choose another.');
  }
}
