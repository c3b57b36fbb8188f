import type { CaseImage } from '../api/list-images';
import { imageWords } from '../image-words';
import styles from './room.module.css';

/** All pictures of the case, small; pressing one opens it in the active place. */
export function FilmStrip({ images, shownId, open }: { images: CaseImage[]; shownId: string; open: (id: string) => void }) {
  if (images.length < 2) return null;
  return (
    <nav aria-label="Pictures of the case">
      <ul className={styles.strip}>
        {images.map((image, index) => (
          <li key={image.id}>
            <button type="button" aria-current={image.id === shownId || undefined} aria-label={`${index + 1}, ${imageWords(image)}`} onClick={() => open(image.id)}>
              <img src={image.addresses.thumb} alt="" loading="lazy" draggable={false} />
            </button>
          </li>
        ))}
      </ul>
    </nav>
  );
}
