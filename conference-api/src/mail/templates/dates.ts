const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

function partsIn(instant: Date, timeZone: string): Record<string, string> {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    weekday: 'long',
    day: 'numeric',
    month: 'numeric',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  return Object.fromEntries(format.formatToParts(instant).map(({ type, value }) => [type, value]));
}

/** `9 Dec 2026`, by the zone's calendar. */
export function dayIn(instant: Date, timeZone: string): string {
  const { day, month, year } = partsIn(instant, timeZone);
  return `${Number(day)} ${MONTHS[Number(month) - 1]} ${year}`;
}

/** `Wednesday 9 Dec 2026, 07:30 (Europe/London)`. */
export function momentIn(instant: Date, timeZone: string): string {
  const { weekday, hour, minute } = partsIn(instant, timeZone);
  return `${weekday} ${dayIn(instant, timeZone)}, ${hour}:${minute} (${timeZone})`;
}
