import { agendaDueAt } from './meeting-times.js';

const now = new Date('2026-12-01T09:00:00Z');

describe('when the agenda is due', () => {
  it('is the set number of hours before the meeting', () => {
    expect(agendaDueAt(new Date('2026-12-09T07:30:00Z'), 48, now).toISOString()).toBe('2026-12-07T07:30:00.000Z');
  });

  it('leaves an hour where the meeting is put in later than that', () => {
    expect(agendaDueAt(new Date('2026-12-02T07:30:00Z'), 48, now).toISOString()).toBe('2026-12-01T10:00:00.000Z');
  });

  it('is never after the start', () => {
    expect(agendaDueAt(new Date('2026-12-01T09:20:00Z'), 48, now).toISOString()).toBe('2026-12-01T09:20:00.000Z');
  });
});
