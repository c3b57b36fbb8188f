/** How one picture is looked at. Nothing of it changes the picture that is stored. */
export interface View {
  /** 1 fits the picture into its place. */
  scale: number;
  /** The picture's middle from the place's middle, in parts of the fitted picture's width and height. */
  x: number;
  y: number;
  /** Window of grey values that is spread over black to white: its middle and its width, in % of the full range. */
  level: number;
  width: number;
  isInverted: boolean;
  /** Quarter turns clockwise. */
  turns: 0 | 1 | 2 | 3;
  isMirrored: boolean;
}

export const FIRST_VIEW: View = { scale: 1, x: 0, y: 0, level: 50, width: 100, isInverted: false, turns: 0, isMirrored: false };

export type Tool = 'move' | 'window';

export interface RoomState {
  /** By pane and picture, so that coming back to a picture finds it as it was left. */
  views: Readonly<Record<string, View>>;
  active: 0 | 1;
  /** Zoom, place and window of both panes change together. */
  isLinked: boolean;
  tool: Tool;
}

export const FIRST_ROOM: RoomState = { views: {}, active: 0, isLinked: false, tool: 'move' };

export type ViewChange =
  /** `x` and `y`: the point that stays put, in the same parts as the picture's place. */
  | { type: 'zoom'; factor: number; x?: number; y?: number }
  | { type: 'scale'; scale: number }
  | { type: 'pan'; x: number; y: number }
  | { type: 'window'; level?: number; width?: number }
  | { type: 'window-by'; level: number; width: number }
  | { type: 'invert' }
  | { type: 'turn'; by: 1 | -1 }
  | { type: 'mirror' }
  | { type: 'reset' };

export type RoomAction = ({ panes: readonly string[] } & ViewChange) | { type: 'activate'; pane: 0 | 1 } | { type: 'link' } | { type: 'tool'; tool: Tool };

const MOST_SCALE = 24;
const between = (low: number, value: number, high: number) => Math.min(high, Math.max(low, value));

/** The middle of the place always lies on the picture, so that it can not be lost from sight. */
function kept(view: View): View {
  const limit = view.scale <= 1 ? 0 : view.scale / 2;
  return { ...view, x: between(-limit, view.x, limit), y: between(-limit, view.y, limit) };
}

function zoomed(view: View, scale: number, x = 0, y = 0): View {
  const to = between(1, scale, MOST_SCALE);
  const factor = to / view.scale;
  return kept({ ...view, scale: to, x: x - (x - view.x) * factor, y: y - (y - view.y) * factor });
}

const windowed = (view: View, level: number, width: number): View => ({ ...view, level: between(0, level, 100), width: between(2, width, 200) });

export function changeView(view: View, change: ViewChange): View {
  switch (change.type) {
    case 'zoom':
      return zoomed(view, view.scale * change.factor, change.x, change.y);
    case 'scale':
      return zoomed(view, change.scale);
    case 'pan':
      return kept({ ...view, x: view.x + change.x, y: view.y + change.y });
    case 'window':
      return windowed(view, change.level ?? view.level, change.width ?? view.width);
    case 'window-by':
      return windowed(view, view.level + change.level, view.width + change.width);
    case 'invert':
      return { ...view, isInverted: !view.isInverted };
    case 'turn':
      // the fitted size changes with it, so the place would mean something else
      return { ...view, x: 0, y: 0, turns: ((view.turns + change.by + 4) % 4) as View['turns'] };
    case 'mirror':
      return { ...view, x: -view.x, isMirrored: !view.isMirrored };
    case 'reset':
      return FIRST_VIEW;
  }
}

export function roomReducer(state: RoomState, action: RoomAction): RoomState {
  switch (action.type) {
    case 'activate':
      return { ...state, active: action.pane };
    case 'link':
      return { ...state, isLinked: !state.isLinked };
    case 'tool':
      return { ...state, tool: action.tool };
    default: {
      const changed = action.panes.map((pane) => [pane, changeView(state.views[pane] ?? FIRST_VIEW, action)]);
      return { ...state, views: { ...state.views, ...Object.fromEntries(changed) } };
    }
  }
}

/**
 * Slope and intercept, on values from 0 to 1, of the window: ((x − level) / width + 0.5), turned round where inverted.
 * Source: DICOM PS3.3, C.11.2.1.3.2, the function LINEAR_EXACT; clipping to 0–1 is the filter's.
 */
export function windowFunction({ level, width, isInverted }: Pick<View, 'level' | 'width' | 'isInverted'>): { slope: number; intercept: number } {
  const slope = 100 / width;
  const intercept = 0.5 - level / width;
  return isInverted ? { slope: -slope, intercept: 1 - intercept } : { slope, intercept };
}

/** `Zoom 150 %, inverted, turned 90°`. */
export function viewWords({ scale, level, width, isInverted, turns, isMirrored }: View): string {
  const words = [`Zoom ${Math.round(scale * 100)}\u00a0%`];
  if (level !== 50 || width !== 100) words.push(`level ${Math.round(level)}\u00a0%, width ${Math.round(width)}\u00a0%`);
  if (isInverted) words.push('inverted');
  if (turns) words.push(`turned ${turns * 90}°`);
  if (isMirrored) words.push('mirrored');
  return words.join(', ');
}

/** The size at which a picture, turned or not, fits into a place. */
export function fittedSize(image: { width: number; height: number }, place: { width: number; height: number }, turns: View['turns']) {
  const [width, height] = turns % 2 ? [image.height, image.width] : [image.width, image.height];
  const scale = Math.min(place.width / width, place.height / height);
  return { width: width * scale, height: height * scale };
}

export const neighbour = (ids: readonly string[], id: string, by: 1 | -1): string | null => ids[ids.indexOf(id) + by] ?? null;
