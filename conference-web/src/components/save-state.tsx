import { formatTime } from '@/lib/dates';

export type SavingState =
  | { kind: 'unchanged' }
  | { kind: 'waiting' }
  | { kind: 'saving' }
  | { kind: 'saved'; at: string | Date }
  /** Kept in this browser; will be tried again. */
  | { kind: 'failed'; retrying: boolean }
  | { kind: 'conflict' };

function words(state: SavingState): string {
  switch (state.kind) {
    case 'unchanged':
      return 'No changes';
    case 'waiting':
      return 'Not saved yet';
    case 'saving':
      return 'Saving';
    case 'saved':
      return `Saved at ${formatTime(state.at)}`;
    case 'failed':
      return state.retrying ? 'Not saved: kept here, trying again' : 'Not saved: kept here';
    case 'conflict':
      return 'Changed by someone else: nothing of either is lost';
  }
}

/** Where the writing stands. Told politely, so that a reader is not cut short at every key. */
export function SaveState({ state }: { state: SavingState }) {
  const isTrouble = state.kind === 'failed' || state.kind === 'conflict';
  return (
    <span className="label-text" role="status" style={isTrouble ? { color: 'var(--red-11)', fontWeight: 600 } : undefined}>
      {words(state)}
    </span>
  );
}
