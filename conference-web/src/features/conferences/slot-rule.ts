/** How often a conference meets, as people say it. */
export const SLOT_KINDS = {
  weekly: 'Every week',
  fortnightly: 'Every second week',
  monthly: 'Once a month, on the same weekday',
  own: 'By a rule of its own',
} as const;
export type SlotKind = keyof typeof SLOT_KINDS;

const DAYS = ['SU', 'MO', 'TU', 'WE', 'TH', 'FR', 'SA'];

/** The weekday of a local `YYYY-MM-DDTHH:mm`, and which of its month it is (the fifth counts as the last). */
function dayOf(start: string): { day: string; nth: number } | null {
  const match = /^(\d{4})-(\d{2})-(\d{2})T/.exec(start);
  if (!match) return null;
  const date = new Date(Date.UTC(Number(match[1]), Number(match[2]) - 1, Number(match[3])));
  const nth = Math.ceil(date.getUTCDate() / 7);
  return { day: DAYS[date.getUTCDay()]!, nth: nth > 4 ? -1 : nth };
}

/** The RFC 5545 rule for meetings that begin at `start`; null where `start` is no date yet. */
export function slotRule(kind: Exclude<SlotKind, 'own'>, start: string): string | null {
  const found = dayOf(start);
  if (!found) return null;
  if (kind === 'monthly') return `FREQ=MONTHLY;BYDAY=${found.nth}${found.day}`;
  return `FREQ=WEEKLY;${kind === 'fortnightly' ? 'INTERVAL=2;' : ''}BYDAY=${found.day}`;
}

/** Which of the kinds a rule is; `own` for all that the form has no words for. */
export function slotKind(rule: string, start: string): SlotKind {
  const kinds = ['weekly', 'fortnightly', 'monthly'] as const;
  if (rule === 'FREQ=WEEKLY') return 'weekly';
  return kinds.find((kind) => slotRule(kind, start) === rule) ?? 'own';
}
