import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import type { CleanedPicture } from '@kerfside/calc/deidentification/picture-clean';
import { uprightTurn } from '@kerfside/calc/deidentification/picture-turn';
import type { TurnPicture } from './clean-picture.js';

/** JPEG comes out as JPEG, with a loss that nobody sees; all others without loss. */
const JPEG_QUALITY = 0.95;

/** Turns pictures on a canvas of the worker; null where there is none. */
export function pictureTurner(): TurnPicture | null {
  return typeof OffscreenCanvas === 'undefined' || typeof createImageBitmap === 'undefined' ? null : turnPicture;
}

async function turnPicture(picture: CleanedPicture): Promise<Uint8Array> {
  // the clean bytes have no EXIF, so no browser turns them by itself
  const bitmap = await createImageBitmap(new Blob([new Uint8Array(picture.bytes)], { type: `image/${picture.kind}` })).catch(() => {
    throw new FileRefusal('broken', 'The picture is broken or cut off. Export it again as PNG or JPEG.');
  });
  const { turn, width, height } = uprightTurn(picture.orientation, bitmap.width, bitmap.height);
  const canvas = new OffscreenCanvas(width, height);
  const context = canvas.getContext('2d');
  if (!context) throw new FileRefusal('not-read', 'This browser has not enough memory to turn the picture. Turn it upright and save it anew.');
  context.setTransform(...turn);
  context.drawImage(bitmap, 0, 0);
  bitmap.close();
  const blob = await canvas.convertToBlob(picture.kind === 'jpeg' ? { type: 'image/jpeg', quality: JPEG_QUALITY } : { type: 'image/png' });
  return new Uint8Array(await blob.arrayBuffer());
}
