import { imageKind, type ImageKind } from '../domain/build/image-kind';
import { sha256Hex } from './sha256';

/** Largest file that is read at all; a phone's storage and memory are not ours to fill. */
export const MAX_PHOTO_BYTES = 40_000_000;
/** What a shrunk photo may weigh, MB, and measure, px: legible joints, quick to send. */
const SHRUNK_MB = 0.6;
const SHRUNK_SIDE = 2_048;

export type PreparedPhoto =
  | {
      ok: true;
      bytes: ArrayBuffer;
      mediaType: Exclude<ImageKind, 'image/heic'>;
      sha256: string;
      width: number;
      height: number;
    }
  | { ok: false; code: 'empty' | 'too-large' | 'not-a-photo' | 'unreadable'; message: string };

/** The parts of a browser that this needs; given, so that tests can do without one. */
export interface PhotoTools {
  /** Draws the picture anew, upright and without metadata, within the limits. */
  shrink: (file: File, limits: { maxSizeMB: number; maxWidthOrHeight: number }) => Promise<Blob>;
  /** Size of a picture that decodes and is not blank; null otherwise. */
  look: (picture: Blob) => Promise<{ width: number; height: number } | null>;
}

/**
 * Makes a photo ready to be kept: read at once, judged by its bytes, turned upright, shrunk, and drawn anew so that no
 * position, camera or time goes with it. What comes back has been decoded once and is not blank.
 */
export async function preparePhoto(file: File, tools: PhotoTools = browserTools): Promise<PreparedPhoto> {
  if (file.size === 0) return no('empty', 'No photo came. Take it again.');
  if (file.size > MAX_PHOTO_BYTES) {
    return no(
      'too-large',
      `This picture has ${Math.round(file.size / 1_000_000)} MB, and ${MAX_PHOTO_BYTES / 1_000_000} MB is the most. Take it again at a smaller size.`,
    );
  }
  let original: ArrayBuffer;
  try {
    original = await file.arrayBuffer();
  } catch {
    // The gallery listed it, and it has gone since, or lies elsewhere where no signal reaches.
    return no('unreadable', 'The picture could not be fetched from your gallery. Choose it again, or take it here.');
  }
  const kind = imageKind(new Uint8Array(original));
  if (kind === null)
    return no('not-a-photo', `${file.name || 'This file'} is not a photo. Choose a JPEG, PNG or WebP picture.`);
  const picture = new File([original], 'photo', { type: kind });
  let shrunk: Blob;
  try {
    shrunk = await tools.shrink(picture, { maxSizeMB: SHRUNK_MB, maxWidthOrHeight: SHRUNK_SIDE });
  } catch {
    return unreadable(kind);
  }
  const size = await tools.look(shrunk);
  const bytes = await shrunk.arrayBuffer();
  const madeKind = imageKind(new Uint8Array(bytes));
  if (!size || madeKind === null || madeKind === 'image/heic') return unreadable(kind);
  return { ok: true, bytes, mediaType: madeKind, sha256: await sha256Hex(bytes), ...size };
}

function unreadable(kind: ImageKind): PreparedPhoto {
  return no(
    'unreadable',
    kind === 'image/heic'
      ? 'This phone cannot turn HEIC pictures into ones that others can see. It stays in your gallery; take it here with the camera instead.'
      : 'The picture cannot be read. It stays in your gallery; take it again.',
  );
}

function no(code: 'empty' | 'too-large' | 'not-a-photo' | 'unreadable', message: string): PreparedPhoto {
  return { ok: false, code, message };
}

const browserTools: PhotoTools = {
  shrink: async (file, limits) => {
    const { default: compress } = await import('browser-image-compression');
    // Its own worker would be loaded from elsewhere, which has no place in a program that works with no signal.
    return compress(file, {
      ...limits,
      useWebWorker: false,
      fileType: 'image/jpeg',
      initialQuality: 0.82,
      alwaysKeepResolution: false,
    });
  },
  look: async (picture) => {
    let bitmap: ImageBitmap;
    try {
      bitmap = await createImageBitmap(picture);
    } catch {
      // Not decodable: the caller says so in words.
      return null;
    }
    const { width, height } = bitmap;
    const canvas = document.createElement('canvas');
    [canvas.width, canvas.height] = [24, 24];
    const context = canvas.getContext('2d', { willReadFrequently: true });
    context?.drawImage(bitmap, 0, 0, 24, 24);
    bitmap.close();
    const alphas = context?.getImageData(0, 0, 24, 24).data.filter((_, i) => i % 4 === 3) ?? [];
    [canvas.width, canvas.height] = [0, 0];
    // A canvas that ran out of memory comes back transparent, without an error.
    return width > 0 && height > 0 && alphas.some((alpha) => alpha > 0) ? { width, height } : null;
  },
};
