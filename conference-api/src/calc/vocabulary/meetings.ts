export const MEETING_STATES = ['planned', 'running', 'closed', 'cancelled'] as const;
export type MeetingState = (typeof MEETING_STATES)[number];
export const MEETING_STATE_WORDS: Record<MeetingState, string> = {
  planned: 'Planned',
  running: 'Running',
  closed: 'Closed',
  cancelled: 'Cancelled',
};
export const AGENDA_ITEM_STATES = ['listed', 'decided', 'deferred'] as const;
export type AgendaItemState = (typeof AGENDA_ITEM_STATES)[number];
export const ATTENDANCE_STATES = ['present', 'remote', 'apologies'] as const;
export type AttendanceState = (typeof ATTENDANCE_STATES)[number];
export const ATTENDANCE_WORDS: Record<AttendanceState, string> = { present: 'Present', remote: 'Remote', apologies: 'Apologies' };
