/* Days and instants as pages write them. */

/** "12 Feb 2025" of an instant, at the site. */
export function dayAt(instant: string, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    day: 'numeric',
    month: 'short',
    year: 'numeric',
  }).format(new Date(instant));
}

const onlyDay = (options: Intl.DateTimeFormatOptions) => {
  const format = new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', ...options });
  return (day: string): string => format.format(new Date(`${day.slice(0, 10)}T12:00:00Z`));
};

/** "12 Feb 2025" of an ISO day. */
export const dayWords = onlyDay({ day: 'numeric', month: 'short', year: 'numeric' });
/** "12 Feb" of an ISO day. */
export const shortDay = onlyDay({ day: 'numeric', month: 'short' });
/** "Thu" of an ISO day. */
export const weekdayWord = onlyDay({ weekday: 'short' });
/** "Tuesday 24 March 2026" of an ISO day. */
export const longDay = onlyDay({ weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' });
