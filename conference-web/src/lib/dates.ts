const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const DAYS: Record<string, string> = { Mon: 'Mon', Tue: 'Tue', Wed: 'Wed', Thu: 'Thu', Fri: 'Fri', Sat: 'Sat', Sun: 'Sun' };

/** The browser's own zone. */
export const localZone = (): string => Intl.DateTimeFormat().resolvedOptions().timeZone;

function parts(at: string | Date, timeZone: string): Record<string, string> {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    weekday: 'short',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZoneName: 'short',
  });
  return Object.fromEntries(format.formatToParts(new Date(at)).map(({ type, value }) => [type, value]));
}

/** `7 Dec 2026`. The months are our own: Intl's English ones differ between browsers ('Sept'). */
export function formatDate(at: string | Date, timeZone = localZone()): string {
  const { day, month, year } = parts(at, timeZone);
  // beside a two-digit hour some versions of Intl pad the day too
  return `${Number(day)} ${MONTHS[Number(month) - 1]} ${year}`;
}

/** `Mon 7 Dec 2026`. */
export function formatDay(at: string | Date, timeZone = localZone()): string {
  const { weekday = '' } = parts(at, timeZone);
  return `${DAYS[weekday] ?? weekday} ${formatDate(at, timeZone)}`;
}

/** `17:30`. */
export function formatTime(at: string | Date, timeZone = localZone()): string {
  const { hour, minute } = parts(at, timeZone);
  return `${hour}:${minute}`;
}

/** `GMT`, `CET`, `GMT+9`: the zone's name at that moment. */
export const zoneName = (at: string | Date, timeZone = localZone()): string => parts(at, timeZone).timeZoneName ?? timeZone;

/** `7 Dec 2026, 17:30`, with the zone's name where it is not the reader's own. */
export function formatDateTime(at: string | Date, timeZone = localZone()): string {
  const zone = timeZone === localZone() ? '' : ` ${zoneName(at, timeZone)}`;
  return `${formatDate(at, timeZone)}, ${formatTime(at, timeZone)}${zone}`;
}

/** `7 Dec 2026, 17:30 GMT`: for times that several people must agree on. */
export const formatDateTimeWithZone = (at: string | Date, timeZone: string): string =>
  `${formatDate(at, timeZone)}, ${formatTime(at, timeZone)} ${zoneName(at, timeZone)}`;
