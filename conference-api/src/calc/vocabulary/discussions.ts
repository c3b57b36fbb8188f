export const ANCHOR_KINDS = ['case', 'section', 'step', 'image'] as const;
export type AnchorKind = (typeof ANCHOR_KINDS)[number];

export const THREAD_KINDS = ['remark', 'question'] as const;
export type ThreadKind = (typeof THREAD_KINDS)[number];

/** A node of TipTap JSON. */
export interface RichText {
  type: string;
  attrs?: Record<string, unknown>;
  content?: RichText[];
  marks?: { type: string; attrs?: Record<string, unknown> }[];
  text?: string;
}
