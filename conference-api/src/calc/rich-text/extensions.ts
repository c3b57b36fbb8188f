import type { AnyExtension } from '@tiptap/core';
import { Mention } from '@tiptap/extension-mention';
import { StarterKit } from '@tiptap/starter-kit';

export const HEADING_LEVELS = [1, 2, 3, 4] as const;

/** What a kept link carries besides its address, whatever was sent. */
export const LINK_ATTRIBUTES = { target: '_blank', rel: 'noopener noreferrer nofollow', class: null, title: null } as const;

/** What a remark may be made of. The editor adds its own suggestion to the mention, nothing else. */
export const richTextExtensions = (): AnyExtension[] => [
  StarterKit.configure({
    heading: { levels: [...HEADING_LEVELS] },
    link: { openOnClick: false, HTMLAttributes: { target: LINK_ATTRIBUTES.target, rel: LINK_ATTRIBUTES.rel } },
  }),
  Mention,
];
