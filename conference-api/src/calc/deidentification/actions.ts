import { isGroupLength, isPrivate } from './dicom-elements.js';
import { KEPT, type KeptAttribute, type KeptAttributes } from './kept-attributes.js';
import { profileCode } from './profile-table.js';
import { BURNED_IN, EMPTIED, MAPPED_UIDS, METHOD_CODES, PIXEL_DATA, SOP_CLASS, STATEMENTS } from './written-attributes.js';

export type DicomAction =
  /** Carried over where its value is a number or a word of its list. */
  | { does: 'keep'; attribute: KeptAttribute }
  /** Written without a value, since every picture must have it. */
  | { does: 'empty' }
  /** Another UID, the same for all files of one upload. */
  | { does: 'replace' }
  /** Written anew, whatever stood there. */
  | { does: 'rewrite' }
  /** The samples themselves, in as many bytes as the picture needs. */
  | { does: 'picture' }
  | { does: 'remove'; because: 'profile' | 'private' | 'not-needed' | 'written-otherwise' };

/**
 * What becomes of an attribute under the Basic Application Confidentiality Profile with the Clean Pixel Data
 * option. The rule is an allow-list: what nobody named is removed, also where the profile would leave it.
 * @param tag Group and element in one number, 0 to 0xffffffff.
 * @param vr How the file writes it; empty where the encoding does not say.
 * @param within What is kept of the item that holds it; left out, the file itself.
 * Source: PS3.15 Annex E, Table E.1-1, edition 2024b (profile-table.ts); what is kept is the project's own choice.
 */
export function actionFor(tag: number, vr: string, within: KeptAttributes = KEPT): DicomAction {
  if (within === KEPT) {
    const own = ownAction(tag);
    if (own) return own;
  }
  const attribute = within.get(tag);
  if (attribute) return isWrittenSo(attribute, vr) ? { does: 'keep', attribute } : { does: 'remove', because: 'written-otherwise' };
  if (isPrivate(tag)) return { does: 'remove', because: 'private' };
  return { does: 'remove', because: profileCode(tag) ? 'profile' : 'not-needed' };
}

/** Group 2 and the attributes that a clean file writes of itself. */
function ownAction(tag: number): DicomAction | null {
  if (tag === PIXEL_DATA) return { does: 'picture' };
  if (MAPPED_UIDS.has(tag)) return { does: 'replace' };
  if (EMPTIED.has(tag)) return { does: 'empty' };
  const isOurs = STATEMENTS.has(tag) || [SOP_CLASS, BURNED_IN, METHOD_CODES].includes(tag);
  if (isOurs || Math.floor(tag / 0x10000) === 2 || isGroupLength(tag)) return { does: 'rewrite' };
  return null;
}

/** Implicit encodings don't say. */
const isWrittenSo = (attribute: KeptAttribute, vr: string) => vr === '' || attribute.vrs.includes(vr);
