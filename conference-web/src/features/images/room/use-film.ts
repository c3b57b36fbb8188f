import { useEffect, useState } from 'react';
import type { CaseImage } from '../api/list-images';

export interface Film {
  address: string;
  size: 'view' | 'full';
  isFetchingFull: boolean;
  /** The full picture could not be fetched; the viewing copy stays. */
  hasFailed: boolean;
}

// the same picture seen again is there at once
const fetched = new Set<string>();
const pictureOf = (address: string) => address.split('?')[0]!;

/** The viewing copy at first, the full picture once it is looked at closely. */
export function useFilm(image: CaseImage, wantsFull: boolean): Film {
  const { full, view } = image.addresses;
  const [loaded, setLoaded] = useState<string | null>(null);
  const [failed, setFailed] = useState<string | null>(null);
  const isHere = loaded === pictureOf(full) || fetched.has(pictureOf(full));
  useEffect(() => {
    if (!wantsFull || isHere) return;
    let isAway = false;
    const picture = new Image();
    picture.src = full;
    picture.decode().then(
      () => {
        fetched.add(pictureOf(full));
        if (!isAway) setLoaded(pictureOf(full));
      },
      () => {
        if (!isAway) setFailed(full);
      },
    );
    return () => {
      isAway = true;
    };
  }, [full, wantsFull, isHere]);
  const isFull = wantsFull && isHere;
  return { address: isFull ? full : view, size: isFull ? 'full' : 'view', isFetchingFull: wantsFull && !isHere && failed !== full, hasFailed: wantsFull && failed === full };
}
