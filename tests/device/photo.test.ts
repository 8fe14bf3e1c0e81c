import { describe, expect, it, vi } from 'vitest';
import { MAX_PHOTO_BYTES, preparePhoto, type PhotoTools } from '@/lib/device/photo';
import { sha256Hex } from '@/lib/device/sha256';

const JPEG = [0xff, 0xd8, 0xff, 0xe1, 1, 2, 3, 4];
const SHRUNK = [0xff, 0xd8, 0xff, 0xdb, 9, 9];
const HEIC = [0, 0, 0, 24, ...'ftypheic'].map((byte) => (typeof byte === 'number' ? byte : byte.charCodeAt(0)));
const file = (bytes: number[] | Uint8Array<ArrayBuffer>, name = 'IMG.JPG') => new File([new Uint8Array(bytes)], name);

/** A browser that shrinks to a fixed picture, or fails as told. */
function tools(trouble: Partial<PhotoTools> = {}): PhotoTools {
  return {
    shrink: vi.fn(async () => new Blob([new Uint8Array(SHRUNK)])),
    look: async () => ({ width: 1_536, height: 2_048 }),
    ...trouble,
  };
}

describe('a photo made ready', () => {
  it('is drawn anew, so that nothing of the original’s metadata goes with it, and named by its own hash', async () => {
    const browser = tools();
    const prepared = await preparePhoto(file(JPEG), browser);
    const bytes = new Uint8Array(SHRUNK).buffer;
    expect(prepared).toMatchObject({ ok: true, mediaType: 'image/jpeg', width: 1_536, height: 2_048 });
    expect(prepared.ok && prepared.sha256).toBe(await sha256Hex(bytes));
    expect(prepared.ok && [...new Uint8Array(prepared.bytes)]).toEqual(SHRUNK);
    expect(browser.shrink).toHaveBeenCalledWith(expect.objectContaining({ type: 'image/jpeg' }), {
      maxSizeMB: 0.6,
      maxWidthOrHeight: 2_048,
    });
  });

  it.each([
    ['nothing', [], 'empty', /No photo came/],
    ['a text named .jpg', [...'Dear bench'].map((c) => c.charCodeAt(0)), 'not-a-photo', /IMG\.JPG is not a photo/],
    ['a film', [0, 0, 0, 24, ...[...'ftypisom'].map((c) => c.charCodeAt(0))], 'not-a-photo', /not a photo/],
  ] as const)('is not %s', async (_, bytes, code, message) => {
    const browser = tools();
    const prepared = await preparePhoto(file([...bytes]), browser);
    expect(prepared).toMatchObject({ ok: false, code });
    expect(prepared.ok ? '' : prepared.message).toMatch(message);
    expect(browser.shrink).not.toHaveBeenCalled();
  });

  it('of 50 MB is not even read', async () => {
    const huge = file(JPEG);
    Object.defineProperty(huge, 'size', { value: 50_000_000 });
    huge.arrayBuffer = () => Promise.reject(new Error('read'));
    expect(await preparePhoto(huge, tools())).toMatchObject({ ok: false, code: 'too-large' });
    expect(MAX_PHOTO_BYTES).toBeLessThan(50_000_000);
  });

  it('that the browser cannot decode stays in the gallery, and HEIC is called by its name', async () => {
    const cannot = tools({ shrink: () => Promise.reject(new Error('decode')) });
    expect(await preparePhoto(file(JPEG), cannot)).toMatchObject({ ok: false, code: 'unreadable' });
    const heic = await preparePhoto(file(HEIC), cannot);
    expect(heic.ok ? '' : heic.message).toMatch(/HEIC/);
  });

  it('that the gallery does not hand over is said to be still there', async () => {
    const away = file(JPEG);
    away.arrayBuffer = () => Promise.reject(new DOMException('gone', 'NotReadableError'));
    const prepared = await preparePhoto(away, tools());
    expect(prepared).toMatchObject({ ok: false, code: 'unreadable' });
    expect(prepared.ok ? '' : prepared.message).toMatch(/from your gallery\. Choose it again/);
  });

  it.each([
    ['HEIC, which others cannot see', HEIC],
    ['a text', [...'Dear bench'].map((c) => c.charCodeAt(0))],
  ])('is not kept as %s, whatever the browser made of it', async (_, made) => {
    const odd = tools({ shrink: async () => new Blob([new Uint8Array(made)]) });
    expect(await preparePhoto(file(JPEG), odd)).toMatchObject({ ok: false, code: 'unreadable' });
  });

  it('goes by the bytes it has, not by its name or by what the browser calls it', async () => {
    const png = [0x89, ...'PNG\r\n\x1a\n'].map((c) => (typeof c === 'number' ? c : c.charCodeAt(0)));
    const browser = tools();
    await preparePhoto(new File([new Uint8Array(png)], 'picture.txt', { type: 'text/plain' }), browser);
    expect(browser.shrink).toHaveBeenCalledWith(expect.objectContaining({ type: 'image/png' }), expect.anything());
  });

  it('that came out blank, as a canvas without memory makes it, is not kept', async () => {
    expect(await preparePhoto(file(JPEG), tools({ look: async () => null }))).toMatchObject({
      ok: false,
      code: 'unreadable',
    });
  });
});
