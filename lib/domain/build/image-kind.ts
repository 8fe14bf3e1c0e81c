export type ImageKind = 'image/jpeg' | 'image/png' | 'image/webp' | 'image/heic';

const ascii = (bytes: Uint8Array, from: number, to: number) => String.fromCharCode(...bytes.subarray(from, to));

/** Kind of picture by its first bytes, whatever its name or header says; null for anything else. */
export function imageKind(bytes: Uint8Array): ImageKind | null {
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return 'image/jpeg';
  if (ascii(bytes, 0, 8) === '\x89PNG\r\n\x1a\n') return 'image/png';
  if (ascii(bytes, 0, 4) === 'RIFF' && ascii(bytes, 8, 12) === 'WEBP') return 'image/webp';
  if (ascii(bytes, 4, 8) === 'ftyp' && /^(heic|heix|hevc|mif1|msf1)$/.test(ascii(bytes, 8, 12))) return 'image/heic';
  return null;
}
