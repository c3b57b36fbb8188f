// Drawn radiographs as eight-bit greyscale PNG, drawn photographs as JPEG.

import sharp from 'sharp';

/**
 * @param {{width: number, height: number, pixels: Uint16Array}} image
 * @param {{window?: {center: number, width: number}}} options 12-bit window; all grey levels by default
 * @returns {Promise<Buffer>}
 */
export function toPng(image, { window = { center: 2047.5, width: 4095 } } = {}) {
  const low = window.center - window.width / 2;
  const grey = new Uint8Array(image.pixels.length);
  for (let i = 0; i < grey.length; i++) {
    const v = (image.pixels[i] - low) / window.width;
    grey[i] = Math.round(255 * Math.min(1, Math.max(0, v)));
  }
  return sharp(grey, { raw: { width: image.width, height: image.height, channels: 1 } })
    .toColourspace('b-w')
    .png({ compressionLevel: 6 })
    .toBuffer();
}

/**
 * @param {{width: number, height: number, rgb: Uint8Array}} photograph
 * @param {{exif?: object}} options EXIF by directory as sharp takes it, to plant identifiers in tests
 * @returns {Promise<Buffer>}
 */
export function toJpeg(photograph, { exif } = {}) {
  const { width, height, rgb } = photograph;
  const picture = sharp(rgb, { raw: { width, height, channels: 3 } }).jpeg({ quality: 88 });
  return (exif ? picture.withExif(exif) : picture).toBuffer();
}
