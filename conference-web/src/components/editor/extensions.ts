import { richTextExtensions } from '@kerfside/calc/rich-text/extensions.js';
import type { AnyExtension } from '@tiptap/core';
import { Placeholder } from '@tiptap/extension-placeholder';
import { safeHref } from './safe-link';

// a link that the server would refuse is refused here, when it is typed or pasted
const LINK = { isAllowedUri: (href: string | undefined) => safeHref(href) !== null, defaultProtocol: 'https', autolink: true, linkOnPaste: true };

/** The server's own list of what a remark may be made of, with this editor's suggestion and placeholder. */
export const editorExtensions = (suggestion: object, placeholder: string): AnyExtension[] => [
  ...richTextExtensions().map((extension: AnyExtension) => {
    if (extension.name === 'starterKit') return extension.configure({ link: LINK });
    return extension.name === 'mention' ? extension.configure({ suggestion }) : extension;
  }),
  Placeholder.configure({ placeholder }),
];
