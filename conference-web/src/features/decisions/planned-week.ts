/** Monday of an ISO 8601 week: week 1 holds the year's first Thursday. Null where the year has no such week. */
export function mondayOf(week: string): Date | null {
  const match = /^(\d{4})-W(\d{2})$/.exec(week);
  if (!match) return null;
  const [year, number] = [Number(match[1]), Number(match[2])];
  // 4 January is always in week 1
  const fourth = new Date(Date.UTC(year, 0, 4));
  const monday = new Date(fourth);
  monday.setUTCDate(4 - ((fourth.getUTCDay() + 6) % 7) + (number - 1) * 7);
  const thursday = new Date(monday);
  thursday.setUTCDate(monday.getUTCDate() + 3);
  return number >= 1 && thursday.getUTCFullYear() === year ? monday : null;
}
