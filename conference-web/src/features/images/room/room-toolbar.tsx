import { EnterFullScreenIcon, ExitFullScreenIcon, ZoomInIcon, ZoomOutIcon } from '@radix-ui/react-icons';
import type { ReactNode } from 'react';
import { FIRST_VIEW } from './room-state';
import type { Room } from './use-room';
import styles from './room.module.css';

interface ToolProps {
  children: ReactNode;
  /** The key that does the same, told beside the name. */
  shortcut: string;
  label?: string;
  isOn?: boolean;
  onPress: () => void;
}

function ToolButton({ children, shortcut, label, isOn, onPress }: ToolProps) {
  return (
    <button type="button" className={styles.tool} aria-pressed={isOn} aria-label={label} aria-keyshortcuts={shortcut} title={`${label ?? String(children)} (${shortcut})`} onClick={onPress}>
      {children}
    </button>
  );
}

interface RoomToolbarProps {
  room: Room;
  canSplit: boolean;
  actualSize: () => void;
  isFullScreen: boolean;
  toggleFullScreen: (() => void) | null;
  isRemarksOpen: boolean;
  toggleRemarks: () => void;
}

/** All that can be done to the active picture. */
export function RoomToolbar({ room, canSplit, actualSize, isFullScreen, toggleFullScreen, isRemarksOpen, toggleRemarks }: RoomToolbarProps) {
  const { change, dispatch, tool, panes, active } = room;
  const view = panes[active]?.view ?? FIRST_VIEW;
  return (
    <div className={styles.toolbar} role="toolbar" aria-label="Picture">
      <div className={styles.group}>
        <ToolButton shortcut="-" label="Zoom out" onPress={() => change({ type: 'zoom', factor: 0.8 })}>
          <ZoomOutIcon />
        </ToolButton>
        <ToolButton shortcut="+" label="Zoom in" onPress={() => change({ type: 'zoom', factor: 1.25 })}>
          <ZoomInIcon />
        </ToolButton>
        <ToolButton shortcut="1" label="1:1, one pixel on one" onPress={actualSize}>
          1:1
        </ToolButton>
      </div>
      <div className={styles.group}>
        <ToolButton shortcut="d" isOn={tool === 'window'} onPress={() => dispatch({ type: 'tool', tool: tool === 'move' ? 'window' : 'move' })}>
          Drag sets window
        </ToolButton>
        <Slider label="Level" shortcut="l L" min={0} max={100} value={view.level} onSlide={(level) => change({ type: 'window', level })} />
        <Slider label="Width" shortcut="w W" min={2} max={200} value={view.width} onSlide={(width) => change({ type: 'window', width })} />
        <ToolButton shortcut="i" isOn={view.isInverted} onPress={() => change({ type: 'invert' })}>
          Invert
        </ToolButton>
      </div>
      <div className={styles.group}>
        <ToolButton shortcut="r" label="Turn clockwise" onPress={() => change({ type: 'turn', by: 1 })}>
          Turn
        </ToolButton>
        <ToolButton shortcut="m" isOn={view.isMirrored} onPress={() => change({ type: 'mirror' })}>
          Mirror
        </ToolButton>
        <ToolButton shortcut="0" label="Reset: everything back as it was" onPress={() => change({ type: 'reset' })}>
          Reset
        </ToolButton>
      </div>
      <div className={styles.group}>
        {canSplit && (
          <ToolButton shortcut="b" isOn={panes.length > 1} onPress={room.toggleBeside}>
            Side by side
          </ToolButton>
        )}
        {panes.length > 1 && (
          <ToolButton shortcut="c" label="Change both together" isOn={room.isLinked} onPress={() => dispatch({ type: 'link' })}>
            Both together
          </ToolButton>
        )}
        {toggleFullScreen && (
          <ToolButton shortcut="f" label="Full screen" isOn={isFullScreen} onPress={toggleFullScreen}>
            {isFullScreen ? <ExitFullScreenIcon /> : <EnterFullScreenIcon />}
          </ToolButton>
        )}
        <ToolButton shortcut="n" isOn={isRemarksOpen} onPress={toggleRemarks}>
          Remarks
        </ToolButton>
      </div>
    </div>
  );
}

interface SliderProps {
  label: string;
  shortcut: string;
  min: number;
  max: number;
  value: number;
  onSlide: (value: number) => void;
}

const Slider = ({ label, shortcut, min, max, value, onSlide }: SliderProps) => (
  <label className={styles.slider} title={`${label} (${shortcut})`}>
    {label}
    <input type="range" min={min} max={max} step={1} value={Math.round(value)} aria-valuetext={`${Math.round(value)} %`} onChange={({ target }) => onSlide(target.valueAsNumber)} />
  </label>
);
