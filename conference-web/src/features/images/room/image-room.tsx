import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { EmptyState, Loaded, TextSkeleton } from '@/components/page-states';
import { caseQuery } from '@/features/cases/api/get-case';
import { Margin } from '@/features/discussions/components/margin';
import { useLiveEvents } from '@/lib/live-events/use-live-events';
import { useDarkRoom } from '@/lib/use-appearance';
import { useTitle } from '@/lib/use-title';
import { type CaseImage, imagesQuery } from '../api/list-images';
import { imageWords } from '../image-words';
import { FilmStage } from './film-stage';
import { FilmStrip } from './film-strip';
import { RoomKeys } from './room-keys';
import { RoomToolbar } from './room-toolbar';
import { useFullScreen } from './use-full-screen';
import { useRoom } from './use-room';
import styles from './room.module.css';

/** The pictures of a case in the dark, since films are read in the dark. */
export function ImageRoom() {
  const { id: caseId = '', imageId = '' } = useParams();
  useTitle('Image');
  useDarkRoom();
  useLiveEvents();
  const query = useQuery(imagesQuery(caseId));
  return (
    <div className={styles.room}>
      <Loaded query={query} what="case" skeleton={<TextSkeleton lines={4} />}>
        {({ items }) =>
          items.some(({ id }) => id === imageId) ? (
            <Films caseId={caseId} images={items} imageId={imageId} onLost={() => void query.refetch()} />
          ) : (
            <EmptyState title="There is no such picture" action={<Link to={paths.case(caseId)}>To the case</Link>}>
              It may have been removed from the case.
            </EmptyState>
          )
        }
      </Loaded>
    </div>
  );
}

interface FilmsProps {
  caseId: string;
  images: CaseImage[];
  imageId: string;
  onLost: () => void;
}

function Films({ caseId, images, imageId, onLost }: FilmsProps) {
  const room = useRoom(caseId, images, imageId);
  const { panes, active, tool, change, dispatch } = room;
  const [isRemarksOpen, setRemarksOpen] = useState(true);
  const { isFullScreen, toggle: toggleFullScreen } = useFullScreen();
  const toggleRemarks = () => setRemarksOpen(!isRemarksOpen);
  const shown = panes[active]!.image;
  const actualSize = () => {
    const film = document.querySelectorAll<HTMLImageElement>('[data-films] img')[active];
    const wide = film?.offsetWidth;
    if (wide) change({ type: 'scale', scale: shown.width / devicePixelRatio / wide });
  };
  return (
    <div className={styles.layout} data-remarks={isRemarksOpen || undefined}>
      <RoomHead {...{ caseId, images, shown, room }} />
      <RoomKeys {...{ room, actualSize, toggleRemarks }} toggleFullScreen={() => toggleFullScreen?.()} />
      <RoomToolbar {...{ room, actualSize, isFullScreen, toggleFullScreen, isRemarksOpen, toggleRemarks }} canSplit={images.length > 1} />
      <main id="main" className={styles.films} data-films data-two={panes.length > 1 || undefined}>
        {panes.map(({ image, view }, pane) => (
          <FilmStage
            key={`${pane} ${image.id}`}
            {...{ image, view, tool, onLost }}
            isActive={pane === active}
            onActivate={panes.length > 1 ? () => pane !== active && dispatch({ type: 'activate', pane: pane as 0 | 1 }) : undefined}
            change={(what) => change(what, pane)}
          />
        ))}
      </main>
      {isRemarksOpen && (
        <aside className={styles.remarks} aria-label="Remarks on this picture">
          <h2>Remarks on this picture</h2>
          <Margin key={shown.id} caseId={caseId} anchorKind="image" anchorRef={shown.id} about={imageWords(shown)} />
        </aside>
      )}
      <footer className={styles.foot}>
        <FilmStrip images={images} shownId={shown.id} open={room.open} />
        <p className={styles.help}>
          Wheel, pinch, <kbd>+</kbd> <kbd>-</kbd> zoom. Drag or arrow keys move. <kbd>j</kbd> <kbd>k</kbd> next and previous. <kbd>w</kbd> <kbd>l</kbd> window.{' '}
          <kbd>i</kbd> invert. <kbd>0</kbd> reset. <kbd>?</kbd> all keys.
        </p>
        <p className={styles.help}>Viewing copies with 256 grey values, not for diagnosis. Zoom, window and turn change nothing in the case.</p>
      </footer>
    </div>
  );
}

function RoomHead({ caseId, images, shown, room }: Pick<FilmsProps, 'caseId' | 'images'> & { shown: CaseImage; room: ReturnType<typeof useRoom> }) {
  const { data: found } = useQuery(caseQuery(caseId));
  const number = images.indexOf(shown) + 1;
  return (
    <header className={styles.head}>
      <Link to={paths.case(caseId)} className={styles.back}>
        {found ? `Back to ${found.code}` : 'Back to the case'}
      </Link>
      <h1>{imageWords(shown)}</h1>
      <div className={styles.group}>
        <button type="button" className={styles.tool} disabled={!room.previous} aria-keyshortcuts="k" onClick={() => room.previous && room.open(room.previous)}>
          Previous
        </button>
        <span className={styles.number}>
          {number} of {images.length}
        </span>
        <button type="button" className={styles.tool} disabled={!room.next} aria-keyshortcuts="j" onClick={() => room.next && room.open(room.next)}>
          Next
        </button>
      </div>
    </header>
  );
}
