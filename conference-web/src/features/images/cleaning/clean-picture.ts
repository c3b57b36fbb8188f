import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { type CleanedPicture, cleanPictureBytes } from '@kerfside/calc/deidentification/picture-clean';
import type { CleanedFile, RemovedItem } from './cleaned-file.js';

/** Turns the pixels of a picture upright and packs them anew. */
export type TurnPicture = (picture: CleanedPicture) => Promise<Uint8Array>;

/**
 * A photograph without anything but its pixels. One that EXIF shows turned is turned first, since without
 * EXIF nothing would say so; that packs its pixels anew. All others keep theirs bit by bit.
 * @param turn Null where this browser can't turn pictures outside a page.
 * Throws FileRefusal where the file is no picture, broken, cut off, or can't be turned.
 */
export async function cleanPicture(bytes: Uint8Array, turn: TurnPicture | null): Promise<CleanedFile> {
  const clean = cleanPictureBytes(bytes);
  const removed = clean.removed.map(({ name, was }): RemovedItem => ({ place: name, name: describe(name), action: 'removed', was }));
  if (clean.orientation === 1) return result(clean, removed);
  if (!turn) throw new FileRefusal('not-read', 'The picture lies on its side, and this browser can not turn it. Turn it upright and save it anew.');
  const turned = cleanPictureBytes(await turn(clean));
  return result(
    turned,
    removed.map((item) => (item.place === 'EXIF Orientation' ? { ...item, action: 'applied' } : item)),
  );
}

function result(clean: CleanedPicture, removed: RemovedItem[]): CleanedFile {
  const size = { place: '', name: 'Pixels', value: `${clean.width} × ${clean.height}` };
  return { kind: clean.kind, bytes: new Uint8Array(clean.bytes), removed, kept: [size], burnedIn: null };
}

/** What a part is, for those who don't know its name. */
function describe(name: string): string {
  if (name.startsWith('EXIF GPS')) return 'where the picture was taken';
  if (name.startsWith('EXIF Thumbnail')) return 'small copy of the picture';
  if (/MakerNote/.test(name)) return "the camera's own data";
  if (/EXIF/.test(name)) return 'data of the camera';
  if (/Date|tIME/.test(name)) return 'a date';
  if (/text|comment|XMP|IPTC/i.test(name)) return 'text';
  return 'part that the picture does not need';
}
