import sharp from 'sharp';
import { uprightTurn } from './picture-turn.js';

const WIDTH = 3;
const HEIGHT = 2;
const PIXELS = [10, 20, 30, 40, 50, 60];

/** What a canvas would draw: each stored pixel's centre, put through the transform. */
function turned(orientation: number) {
  const { turn, width, height } = uprightTurn(orientation, WIDTH, HEIGHT);
  const [a, b, c, d, e, f] = turn;
  const drawn = new Array<number>(width * height).fill(-1);
  PIXELS.forEach((value, i) => {
    const [x, y] = [(i % WIDTH) + 0.5, Math.floor(i / WIDTH) + 0.5];
    drawn[Math.floor(b * x + d * y + f) * width + Math.floor(a * x + c * y + e)] = value;
  });
  return { drawn, width, height };
}

// the reader from outside: sharp (libvips), which turns by the EXIF tag that it wrote itself
it.each([1, 2, 3, 4, 5, 6, 7, 8])('turns a picture with the EXIF orientation %s as sharp does', async (orientation) => {
  const lying = await sharp(Buffer.from(PIXELS), { raw: { width: WIDTH, height: HEIGHT, channels: 1 } })
    .withMetadata({ orientation })
    .png()
    .toBuffer();
  const { data, info } = await sharp(lying).rotate().toColourspace('b-w').raw().toBuffer({ resolveWithObject: true });
  expect(turned(orientation)).toEqual({ drawn: [...data], width: info.width, height: info.height });
});
