const HOUR = 3_600_000;

/**
 * When the server sends the agenda by itself. A meeting that is put in later than that leaves an hour to
 * make its agenda, but never past its start.
 */
export function agendaDueAt(startsAt: Date, hoursBefore: number, now: Date): Date {
  const usual = startsAt.getTime() - hoursBefore * HOUR;
  if (usual > now.getTime()) return new Date(usual);
  return new Date(Math.min(now.getTime() + HOUR, startsAt.getTime()));
}
