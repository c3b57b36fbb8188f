import type { RichText } from '@kerfside/calc/vocabulary/discussions.js';
import type { Schemas } from '@/lib/api/types';

/** Somebody who can be mentioned. */
export type Mentionable = Schemas['PersonRefDto'];

export interface EditorProps {
  /** Read out as the field's name. */
  label: string;
  /** What it opens with; later changes of it are not taken over, since the person is writing. */
  content: RichText | null;
  /** At every change. `isEmpty`: there is nothing worth sending. */
  onChange: (content: RichText, isEmpty: boolean) => void;
  /** Who can be mentioned after an `@`. */
  people: Mentionable[];
  placeholder?: string;
  autoFocus?: boolean;
  /** Ctrl+Enter, or Cmd+Enter. */
  onSend?: () => void;
  describedBy?: string;
}
