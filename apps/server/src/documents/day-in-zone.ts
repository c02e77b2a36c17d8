/** The calendar day of an instant in an IANA time zone, YYYY-MM-DD; in UTC where the zone is not known here. */
export function dayInZone(instant: Date, timeZone: string): string {
  try {
    const parts = new Intl.DateTimeFormat('en-GB', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).formatToParts(instant);
    const part = (type: string) => parts.find((each) => each.type === type)?.value ?? '';
    return `${part('year')}-${part('month')}-${part('day')}`;
  } catch (error) {
    if (error instanceof RangeError) return instant.toISOString().slice(0, 10);
    throw error;
  }
}
