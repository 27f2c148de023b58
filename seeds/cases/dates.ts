/* Dates of the invented site, moved by whole days so that what was nine days away stays nine days away. */

const DAY = 86_400_000;

/** Moves days and instants of the invented site to the time around the day of seeding. */
export type Shift = { days: number; day(text: string): string; instant(text: string): string };

/** The shift from the day on which the invented site was written down to `today` (ISO day). */
export function shiftTo(asOf: string, today: string): Shift {
  const days = Math.round(
    (Date.parse(`${today}T00:00:00Z`) - Date.parse(`${asOf.slice(0, 10)}T00:00:00Z`)) / DAY,
  );
  const moved = (text: string): Date => new Date(Date.parse(text) + days * DAY);
  return {
    days,
    day: (text) =>
      moved(`${text.slice(0, 10)}T00:00:00Z`)
        .toISOString()
        .slice(0, 10),
    instant: (text) => moved(text.length === 10 ? `${text}T09:00:00Z` : text).toISOString(),
  };
}

const DATE = /\b(20\d\d)-(\d\d)-(\d\d)\b/g;
const WRITTEN =
  /\b(\d{1,2}) (January|February|March|April|May|June|July|August|September|October|November|December)\b/g;
const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/**
 * Moves the days that a sentence of a case names: `2026-03-25`, `25 March`. Years of revisions and drawings stay, because
 * only whole dates are touched. A written day has no year: it is read in the year of the case.
 */
export function moveText(text: string, shift: Shift, year: number): string {
  if (shift.days === 0) return text;
  const iso = text.replace(DATE, (date) => shift.day(date));
  return iso.replace(WRITTEN, (_all, day: string, month: string) => {
    const number = String(MONTHS.indexOf(month) + 1).padStart(2, '0');
    const moved = shift.day(`${String(year)}-${number}-${day.padStart(2, '0')}`);
    return `${String(Number(moved.slice(8)))} ${MONTHS[Number(moved.slice(5, 7)) - 1] ?? month}`;
  });
}
