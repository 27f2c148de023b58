/* Instants as the record shows them: the day and the minute at the site, with its zone where that matters. */

/** "21 Mar 2026 14:05" at the site. */
export function instantWords(at: string, zone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
  }).format(new Date(at));
  return parts.replace(',', '');
}

/** "21 Mar 2026 14:05 CET" at the zone in which someone signed. */
export function zonedWords(at: string, zone: string): string {
  const name = new Intl.DateTimeFormat('en-GB', { timeZone: zone, timeZoneName: 'short' })
    .formatToParts(new Date(at))
    .find((part) => part.type === 'timeZoneName')?.value;
  return `${instantWords(at, zone)} ${name ?? zone}`;
}

/** A hash in its short form, "c20d 91fe 7a34". */
export function shortHash(hash: string): string {
  return (hash.slice(0, 12).match(/.{4}/g) ?? [hash]).join(' ');
}
