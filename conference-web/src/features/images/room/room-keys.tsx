import { useKey } from '@/components/keys/use-key';
import type { Room } from './use-room';

interface RoomKeysProps {
  room: Room;
  actualSize: () => void;
  toggleFullScreen: () => void;
  toggleRemarks: () => void;
}

const STEP = 0.12;
const ZOOM = 1.25;

/** Every command of the room by a key. Draws nothing. */
export function RoomKeys({ room, actualSize, toggleFullScreen, toggleRemarks }: RoomKeysProps) {
  const { change, open, previous, next, panes, active } = room;
  const isZoomed = (panes[active]?.view.scale ?? 1) > 1;
  const go = (id: string | null) => {
    if (id) open(id);
  };
  const sideways = (id: string | null, x: number) => (isZoomed ? change({ type: 'pan', x, y: 0 }) : go(id));
  useKey('ArrowLeft', 'Previous picture; when zoomed in, move left', () => sideways(previous, STEP));
  useKey('ArrowRight', 'Next picture; when zoomed in, move right', () => sideways(next, -STEP));
  useKey('ArrowUp', 'When zoomed in, move up', () => change({ type: 'pan', x: 0, y: STEP }));
  useKey('ArrowDown', 'When zoomed in, move down', () => change({ type: 'pan', x: 0, y: -STEP }));
  useKey('k', 'Previous picture', () => go(previous));
  useKey('j', 'Next picture', () => go(next));
  useKey('+', 'Zoom in', () => change({ type: 'zoom', factor: ZOOM }));
  useKey('-', 'Zoom out', () => change({ type: 'zoom', factor: 1 / ZOOM }));
  useKey('1', 'One pixel of the picture on one of the screen', actualSize);
  useKey('0', 'Everything back as it was', () => change({ type: 'reset' }));
  useKey('w', 'Narrower window: more contrast', () => change({ type: 'window-by', level: 0, width: -5 }));
  useKey('W', 'Wider window: less contrast', () => change({ type: 'window-by', level: 0, width: 5 }));
  useKey('l', 'Lower level: brighter', () => change({ type: 'window-by', level: -3, width: 0 }));
  useKey('L', 'Higher level: darker', () => change({ type: 'window-by', level: 3, width: 0 }));
  useKey('i', 'Invert', () => change({ type: 'invert' }));
  useKey('r', 'Turn clockwise', () => change({ type: 'turn', by: 1 }));
  useKey('R', 'Turn anticlockwise', () => change({ type: 'turn', by: -1 }));
  useKey('m', 'Mirror', () => change({ type: 'mirror' }));
  useKey('d', 'Dragging moves, or sets the window', () => room.dispatch({ type: 'tool', tool: room.tool === 'move' ? 'window' : 'move' }));
  useKey('b', 'Two side by side', room.toggleBeside);
  useKey('x', 'The other of two', () => room.dispatch({ type: 'activate', pane: active === 0 ? 1 : 0 }));
  useKey('c', 'Change both together', () => room.dispatch({ type: 'link' }));
  useKey('f', 'Full screen', toggleFullScreen);
  useKey('n', 'Remarks on this picture', toggleRemarks);
  return null;
}
