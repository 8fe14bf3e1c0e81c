import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sha256Hex } from '@/lib/device/sha256';

const bytesOf = (text: string) => new TextEncoder().encode(text).buffer;

describe('the hash of bytes', () => {
  it.each([
    // FIPS 180-4 (2015), the examples published with it; the empty message: NIST CAVP, SHA256ShortMsg, Len = 0.
    ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
  ])('of "%s" is the published one', async (text, hash) => {
    expect(await sha256Hex(bytesOf(text))).toBe(hash);
  });

  it('is what the server reckons for any bytes', async () => {
    await fc.assert(
      fc.asyncProperty(fc.uint8Array({ maxLength: 300 }), async (bytes) => {
        const own = new Uint8Array(bytes);
        expect(await sha256Hex(own.buffer)).toBe(createHash('sha256').update(own).digest('hex'));
      }),
    );
  });
});
