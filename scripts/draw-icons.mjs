// Draws the mark as the icons that phones ask for: node scripts/draw-icons.mjs
import sharp from 'sharp';

const mark = (scale) => {
  const size = 512;
  const [width, height] = [32 * scale, 40 * scale];
  return Buffer.from(`<svg xmlns="http://www.w3.org/2000/svg" width="${size}" height="${size}">
    <rect width="${size}" height="${size}" fill="#f7f4ec"/>
    <g transform="translate(${(size - width) / 2} ${(size - height) / 2}) scale(${scale})" fill="none" stroke="#191c1e">
      <path d="M9 38V13C9 6.5 13.5 3.5 18.5 3.5S27 7 28 13.5" stroke-width="5.5"/>
      <path d="M24.5 15.5h6.5" stroke-width="4"/>
    </g>
  </svg>`);
};

await sharp(mark(9)).resize(192).png().toFile('public/icon-192.png');
await sharp(mark(9)).png().toFile('public/icon-512.png');
await sharp(mark(6.5)).png().toFile('public/icon-maskable-512.png');
await sharp(mark(9)).resize(180).png().toFile('app/apple-icon.png');
await sharp(mark(9)).resize(64).png().toFile('app/icon.png');
