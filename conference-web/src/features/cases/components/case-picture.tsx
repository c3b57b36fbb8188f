import { PROJECTION_WORDS } from '@kerfside/calc/vocabulary/images.js';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import type { Schemas } from '@/lib/api/types';
import styles from './case-picture.module.css';

type Image = Schemas['ImageDto'];

/** `AP pelvis, 3 months before`. */
export const imageWords = ({ projection, interval }: Pick<Image, 'projection' | 'interval'>): string =>
  [PROJECTION_WORDS[projection], interval].filter(Boolean).join(', ');

interface PictureProps {
  caseId: string;
  image: Image;
  /** Large enough to read what is burned into it. */
  isLarge?: boolean;
}

/** One picture with its projection, interval and caption; a link to the image room. */
export function CasePicture({ caseId, image, isLarge = false }: PictureProps) {
  return (
    <figure className={styles.figure} data-large={isLarge || undefined}>
      <Link to={paths.caseImage(caseId, image.id)} aria-label={`Open ${imageWords(image)} in the image room`}>
        <img
          src={isLarge ? image.addresses.view : image.addresses.thumb}
          alt={image.caption || imageWords(image)}
          width={image.width}
          height={image.height}
          loading="lazy"
        />
      </Link>
      <figcaption>
        <strong>{PROJECTION_WORDS[image.projection]}</strong>
        <span>{image.interval || 'interval not known'}</span>
        {image.caption && <span>{image.caption}</span>}
      </figcaption>
    </figure>
  );
}
