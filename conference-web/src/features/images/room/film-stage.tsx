import { Button } from '@radix-ui/themes';
import { useEffect, useId, useRef, useState } from 'react';
import type { CaseImage } from '../api/list-images';
import { imageAlt, imageWords } from '../image-words';
import { fittedSize, type Tool, type View, type ViewChange, viewWords, windowFunction } from './room-state';
import { useFilm } from './use-film';
import { useStagePointers } from './use-stage-pointers';
import styles from './room.module.css';

interface FilmStageProps {
  image: CaseImage;
  view: View;
  tool: Tool;
  isActive: boolean;
  /** Only where two stand side by side. */
  onActivate?: () => void;
  change: (change: ViewChange) => void;
  /** Its addresses may have ended. */
  onLost: () => void;
}

const VIEW_EDGE = 1600;

function useSize() {
  const element = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState({ width: 0, height: 0 });
  useEffect(() => {
    if (!element.current) return;
    const observer = new ResizeObserver(([entry]) => entry && setSize({ width: entry.contentRect.width, height: entry.contentRect.height }));
    observer.observe(element.current);
    return () => observer.disconnect();
  }, []);
  return { element, size };
}

/** One picture in its place. */
export function FilmStage({ image, view, tool, isActive, onActivate, change, onLost }: FilmStageProps) {
  const { element, size } = useSize();
  const filterId = useId();
  const fitted = fittedSize(image, size, view.turns);
  const pixelsShown = Math.max(fitted.width, fitted.height) * view.scale * devicePixelRatio;
  const film = useFilm(image, size.width > 0 && (view.scale > 1 || pixelsShown > VIEW_EDGE));
  const pointers = useStagePointers({ stage: element, fitted, tool, change });
  const [lost, setLost] = useState<string | null>(null);
  const isSideways = view.turns % 2 === 1;
  return (
    <figure className={styles.pane} data-active={(isActive && onActivate) || undefined} onPointerDownCapture={onActivate} onFocusCapture={onActivate}>
      <div ref={element} className={styles.stage} data-tool={tool} role="group" aria-label={imageWords(image)} {...pointers}>
        <WindowFilter id={filterId} view={view} />
        {/* the filter is on the place, not on the picture: however far it is zoomed, only what is seen is worked on */}
        <div className={styles.filtered} style={{ filter: `url("#${filterId}")` }}>
          {size.width > 0 && lost !== film.address && (
            <img
              src={film.address}
              alt={imageAlt(image)}
              draggable={false}
              onError={() => setLost(film.address)}
              style={{
                width: isSideways ? fitted.height : fitted.width,
                height: isSideways ? fitted.width : fitted.height,
                transform: `translate(-50%, -50%) translate(${view.x * fitted.width}px, ${view.y * fitted.height}px) scale(${view.scale}) scaleX(${view.isMirrored ? -1 : 1}) rotate(${view.turns * 90}deg)`,
              }}
            />
          )}
        </div>
        {lost === film.address && (
          <div className={styles.lost} role="alert">
            <p>The picture could not be fetched.</p>
            <Button
              onClick={() => {
                setLost(null);
                onLost();
              }}
            >
              Try again
            </Button>
          </div>
        )}
        {view.isMirrored && <p className={styles.mirrored}>Mirrored: left and right are swapped</p>}
      </div>
      <figcaption>
        <span>
          <strong>{imageWords(image)}</strong> {image.caption}
        </span>
        <span role="status">
          {viewWords(view)}
          {film.isFetchingFull ? '. Fetching the full picture' : film.hasFailed ? '. The full picture could not be fetched' : ''}
        </span>
        <span className={styles.copy}>
          {film.size === 'full' ? `Full picture, ${image.width} × ${image.height}` : 'Viewing copy'}
        </span>
      </figcaption>
    </figure>
  );
}

function WindowFilter({ id, view }: { id: string; view: View }) {
  const { slope, intercept } = windowFunction(view);
  const channel = { type: 'linear' as const, slope, intercept };
  return (
    <svg width="0" height="0" aria-hidden="true" style={{ position: 'absolute' }}>
      <filter id={id} x="0" y="0" width="100%" height="100%" colorInterpolationFilters="sRGB">
        <feComponentTransfer>
          <feFuncR {...channel} />
          <feFuncG {...channel} />
          <feFuncB {...channel} />
        </feComponentTransfer>
      </filter>
    </svg>
  );
}
