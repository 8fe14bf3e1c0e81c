import sharp from 'sharp';

/** A real JPEG as a phone makes it: lying on its side, with the turn and the position in its metadata. */
export async function phonePhoto(red: number): Promise<Buffer> {
  const picture = sharp({ create: { width: 1_600, height: 1_200, channels: 3, background: { r: red, g: 120, b: 60 } } })
    .composite([
      {
        input: Buffer.from('<svg width="400" height="300"><rect width="400" height="300" fill="#ffffff"/></svg>'),
        top: 0,
        left: 0,
      },
    ])
    .jpeg({ quality: 90 })
    .withExif({
      IFD0: { Make: 'Camera of a phone' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1', GPSLongitudeRef: 'W', GPSLongitude: '0/1 7/1 0/1' },
    })
    .withMetadata({ orientation: 6 });
  return picture.toBuffer();
}
