import { type PointerEvent as ReactPointerEvent, type RefObject, useEffect, useRef, useState } from 'react';
import { indexAfterDrag } from './running-order-scale';

interface Drag {
  id: string;
  startIndex: number;
  /** From the pointer to the top of what is dragged. */
  grab: number;
  height: number;
  top: number;
}

interface SlotDragOptions {
  list: RefObject<HTMLElement | null>;
  ids: string[];
  /** The middle of each slot in the list, in pixels. */
  middles: () => number[];
  onMove?: (from: number, to: number) => void;
}

/** Drags a slot by its handle with mouse, pen or finger; Escape puts it back. */
export function useSlotDrag({ list, ids, middles, onMove }: SlotDragOptions) {
  const [drag, setDrag] = useState<Drag | null>(null);
  const latest = useRef({ ids, middles, onMove, drag });
  useEffect(() => {
    latest.current = { ids, middles, onMove, drag };
  });
  const draggedId = drag?.id;

  useEffect(() => {
    if (!draggedId) return;
    const follow = (event: PointerEvent) => {
      const now = latest.current;
      const box = list.current?.getBoundingClientRect();
      if (!box || !now.drag) return;
      const top = event.clientY - box.top - now.drag.grab;
      setDrag({ ...now.drag, top });
      const index = now.ids.indexOf(draggedId);
      const to = indexAfterDrag(now.middles(), index, top + now.drag.height / 2);
      if (to !== index) now.onMove?.(index, to);
    };
    const end = () => setDrag(null);
    const cancel = (event: KeyboardEvent | PointerEvent) => {
      if (event instanceof KeyboardEvent && event.key !== 'Escape') return;
      const now = latest.current;
      if (now.drag) now.onMove?.(now.ids.indexOf(draggedId), now.drag.startIndex);
      setDrag(null);
    };
    // on the window, since moving a slot in the list takes a captured pointer away from it
    addEventListener('pointermove', follow);
    addEventListener('pointerup', end);
    addEventListener('pointercancel', cancel);
    addEventListener('keydown', cancel);
    return () => {
      removeEventListener('pointermove', follow);
      removeEventListener('pointerup', end);
      removeEventListener('pointercancel', cancel);
      removeEventListener('keydown', cancel);
    };
  }, [draggedId, list]);

  const begin = (id: string) => (event: ReactPointerEvent<HTMLElement>) => {
    const isHandle = event.target instanceof Element && event.target.closest('[data-drag-handle]');
    const box = list.current?.getBoundingClientRect();
    if (!onMove || !isHandle || !box || event.button !== 0) return;
    event.preventDefault();
    const slot = event.currentTarget.getBoundingClientRect();
    setDrag({ id, startIndex: ids.indexOf(id), grab: event.clientY - slot.top, height: slot.height, top: slot.top - box.top });
  };
  return { drag, begin };
}
