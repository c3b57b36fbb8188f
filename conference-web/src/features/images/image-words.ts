import { PROJECTION_WORDS } from '@kerfside/calc/vocabulary/images.js';
import type { CaseImage } from './api/list-images';

/** `AP pelvis, 9 years after the index operation`. */
export const imageWords = ({ projection, interval }: Pick<CaseImage, 'projection' | 'interval'>): string =>
  [PROJECTION_WORDS[projection], interval].filter(Boolean).join(', ');

/** The same with its caption: what a reader who does not see it is told. */
export const imageAlt = (image: Pick<CaseImage, 'projection' | 'interval' | 'caption'>): string => [imageWords(image), image.caption].filter(Boolean).join('. ');
