/** What a mail is made of; text and HTML come from these alone. */
export type Block =
  | { kind: 'heading'; text: string }
  | { kind: 'paragraph'; text: string }
  | { kind: 'table'; columns: readonly Column[]; rows: readonly (readonly string[])[] }
  | { kind: 'link'; label: string; url: string }
  | { kind: 'note'; text: string };

export interface Column {
  title: string;
  /** Numbers stand to the right. */
  numeric?: boolean;
  /** Never broken into two lines: a case's code. */
  isCode?: boolean;
}

export const heading = (text: string): Block => ({ kind: 'heading', text });
export const paragraph = (text: string): Block => ({ kind: 'paragraph', text });
export const link = (label: string, url: string): Block => ({ kind: 'link', label, url });
/** Set apart: a caution, or what to do where the mail was not expected. */
export const note = (text: string): Block => ({ kind: 'note', text });
export const table = (columns: readonly Column[], rows: readonly (readonly string[])[]): Block => ({ kind: 'table', columns, rows });
