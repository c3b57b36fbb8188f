import { type PointerEvent, type RefObject, useEffect, useRef } from 'react';
import type { Tool, ViewChange } from './room-state';

interface StagePointers {
  stage: RefObject<HTMLElement | null>;
  /** The fitted picture in pixels. */
  fitted: { width: number; height: number };
  tool: Tool;
  change: (change: ViewChange) => void;
}

interface Point {
  x: number;
  y: number;
}

const middle = (points: Point[]): Point => ({ x: mean(points.map(({ x }) => x)), y: mean(points.map(({ y }) => y)) });
const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
const apart = ([one, other]: Point[]) => (one && other ? Math.hypot(one.x - other.x, one.y - other.y) : 0);

/** Wheel, drag and pinch on a picture. */
export function useStagePointers({ stage, fitted, tool, change }: StagePointers) {
  const pointers = useRef(new Map<number, Point>());
  const latest = useRef({ fitted, change });
  useEffect(() => {
    latest.current = { fitted, change };
  });

  /** A point of the page in parts of the fitted picture, from the place's middle. */
  const inParts = ({ x, y }: Point) => {
    const box = stage.current!.getBoundingClientRect();
    const { width, height } = latest.current.fitted;
    return { x: (x - box.left - box.width / 2) / width, y: (y - box.top - box.height / 2) / height };
  };

  useEffect(() => {
    const element = stage.current;
    if (!element) return;
    const zoom = (event: WheelEvent) => {
      // React's wheel listeners are passive: the page would scroll too
      event.preventDefault();
      const pixels = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * 16 : event.deltaY;
      const speed = event.ctrlKey ? 0.01 : 0.0018;
      latest.current.change({ type: 'zoom', factor: Math.exp(-pixels * speed), ...inParts({ x: event.clientX, y: event.clientY }) });
    };
    element.addEventListener('wheel', zoom, { passive: false });
    return () => element.removeEventListener('wheel', zoom);
  });

  const onPointerDown = (event: PointerEvent<HTMLElement>) => {
    if (event.button !== 0) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    pointers.current.set(event.pointerId, { x: event.clientX, y: event.clientY });
  };
  const onPointerMove = (event: PointerEvent<HTMLElement>) => {
    if (!pointers.current.has(event.pointerId)) return;
    const before = [...pointers.current.values()];
    pointers.current.set(event.pointerId, { x: event.clientX, y: event.clientY });
    const after = [...pointers.current.values()];
    const from = middle(before);
    const to = middle(after);
    if (after.length === 1 && tool === 'window') {
      change({ type: 'window-by', width: (to.x - from.x) / 4, level: (from.y - to.y) / 4 });
      return;
    }
    change({ type: 'pan', x: (to.x - from.x) / fitted.width, y: (to.y - from.y) / fitted.height });
    const [was, is] = [apart(before), apart(after)];
    if (after.length === 2 && was > 0) change({ type: 'zoom', factor: is / was, ...inParts(to) });
  };
  const onPointerUp = (event: PointerEvent<HTMLElement>) => void pointers.current.delete(event.pointerId);
  return { onPointerDown, onPointerMove, onPointerUp, onPointerCancel: onPointerUp };
}
