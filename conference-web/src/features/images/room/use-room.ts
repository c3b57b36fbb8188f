import { useReducer } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import type { CaseImage } from '../api/list-images';
import { FIRST_ROOM, FIRST_VIEW, neighbour, roomReducer, type View, type ViewChange } from './room-state';

export interface Pane {
  image: CaseImage;
  view: View;
}

/** Which pictures are in the room (in the address) and how they are looked at (here). */
export function useRoom(caseId: string, images: readonly CaseImage[], imageId: string) {
  const navigate = useNavigate();
  const [address] = useSearchParams();
  const [state, dispatch] = useReducer(roomReducer, FIRST_ROOM);
  const ids = images.map(({ id }) => id);
  const besideId = address.get('beside');
  const shown = [imageId, besideId].map((id) => images.find((image) => image.id === id)).filter((image) => image !== undefined);
  const keyOf = (pane: number) => `${pane} ${shown[pane]?.id}`;
  const active = shown.length > 1 ? state.active : 0;

  const go = (first: string, beside: string | null) =>
    void navigate({ pathname: paths.caseImage(caseId, first), search: beside ? `?beside=${beside}` : '' }, { replace: true });
  const change = (what: ViewChange, pane: number = active) => {
    const isForBoth = state.isLinked && shown.length > 1 && !['turn', 'mirror'].includes(what.type);
    dispatch({ ...what, panes: isForBoth ? [keyOf(0), keyOf(1)] : [keyOf(pane)] });
  };
  const open = (id: string) => (active === 1 ? go(imageId, id) : go(id, besideId));
  return {
    panes: shown.map((image, pane): Pane => ({ image, view: state.views[keyOf(pane)] ?? FIRST_VIEW })),
    active,
    isLinked: state.isLinked,
    tool: state.tool,
    dispatch,
    change,
    open,
    previous: neighbour(ids, shown[active]?.id ?? '', -1),
    next: neighbour(ids, shown[active]?.id ?? '', 1),
    /** Puts a second picture beside the first, or takes it away. */
    toggleBeside: () => {
      if (besideId) {
        go(shown[active]?.id ?? imageId, null);
        dispatch({ type: 'activate', pane: 0 });
        return;
      }
      go(imageId, neighbour(ids, imageId, 1) ?? neighbour(ids, imageId, -1) ?? imageId);
      dispatch({ type: 'activate', pane: 1 });
    },
  };
}

export type Room = ReturnType<typeof useRoom>;
