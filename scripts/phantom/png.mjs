// Eight-bit greyscale PNG of a drawn radiograph.

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
