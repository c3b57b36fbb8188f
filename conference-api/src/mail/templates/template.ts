import type { CalendarFacts } from '../calendar.js';
import type { Block } from './blocks.js';

export interface MailContent {
  /** No clinical detail: subjects are read on locked screens. */
  subject: string;
  blocks: Block[];
  calendar?: CalendarFacts;
}

/** How one kind of mail is written; `D` is what its outbox row holds. */
export interface Template<D> {
  /** Without these it is not sent. */
  needs: readonly (keyof D & string)[];
  /** Emptied in the outbox once the mail is sent. */
  secrets?: readonly (keyof D & string)[];
  render(data: D): MailContent;
}
