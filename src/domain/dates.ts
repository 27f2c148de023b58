/* Due dates counted from a day that is given in: ISO days and UTC instants, pure arithmetic, no clock. */
import type { Day, Instant } from '@domain/basis/figures';

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
const DAYS_TO_EPOCH = 719_468;
const DAYS_PER_ERA = 146_097;

/** Days since 1970-01-01 of a date of the Gregorian calendar (years counted from March, eras of 400 years). */
function countOf(year: number, month: number, dayOfMonth: number): number {
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * ((month + 9) % 12) + 2) / 5) + dayOfMonth - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * DAYS_PER_ERA + dayOfEra - DAYS_TO_EPOCH;
}

const two = (value: number) => String(value).padStart(2, '0');

/** The ISO day of a count of days since 1970-01-01. */
function dayOfCount(count: number): Day {
  const shifted = count + DAYS_TO_EPOCH;
  const era = Math.floor(shifted / DAYS_PER_ERA);
  const dayOfEra = shifted - era * DAYS_PER_ERA;
  const leapDays =
    Math.floor(dayOfEra / 1460) - Math.floor(dayOfEra / 36_524) + Math.floor(dayOfEra / 146_096);
  const yearOfEra = Math.floor((dayOfEra - leapDays) / 365);
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const monthFromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9;
  const year = yearOfEra + era * 400 + (month <= 2 ? 1 : 0);
  const dayOfMonth = dayOfYear - Math.floor((153 * monthFromMarch + 2) / 5) + 1;
  return `${String(year).padStart(4, '0')}-${two(month)}-${two(dayOfMonth)}`;
}

function numbersOf(day: Day): [number, number, number] {
  const [year = Number.NaN, month = Number.NaN, dayOfMonth = Number.NaN] = day
    .slice(0, 10)
    .split('-')
    .map(Number);
  return [year, month, dayOfMonth];
}

function count(day: Day): number {
  return countOf(...numbersOf(day));
}

/** True for a day of the calendar written 2026-02-28; false for 2026-02-30 and for any other writing. */
export function isDay(text: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(text) && dayOfCount(count(text)) === text;
}

/** The day so many calendar days later (earlier when negative). */
export function addDays(day: Day, days: number): Day {
  return dayOfCount(count(day) + Math.trunc(days));
}

/** 0 Sunday … 6 Saturday. */
export function weekdayOf(day: Day): number {
  return (((count(day) + 4) % 7) + 7) % 7;
}

/** True Monday to Friday; holidays are not known here. */
export function isWorkingDay(day: Day): boolean {
  const weekday = weekdayOf(day);
  return weekday >= 1 && weekday <= 5;
}

/**
 * The day so many working days later, Monday to Friday: five from a Monday is the next Monday, one from a Saturday is
 * Monday. 0 gives the day itself, or the Monday after a weekend.
 */
export function addWorkingDays(day: Day, days: number): Day {
  let at = day;
  for (let left = days; left > 0; left -= isWorkingDay(at) ? 1 : 0) at = addDays(at, 1);
  while (!isWorkingDay(at)) at = addDays(at, 1);
  return at;
}

function isLeap(year: number): boolean {
  return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

function daysInMonth(year: number, month: number): number {
  if (month === 2) return isLeap(year) ? 29 : 28;
  return [4, 6, 9, 11].includes(month) ? 30 : 31;
}

/** The same day of the month so many months later, or that month's last day (31 January + 1 month = 28 February). */
export function addMonths(day: Day, months: number): Day {
  const [year, month, dayOfMonth] = numbersOf(day);
  const total = year * 12 + month - 1 + Math.trunc(months);
  const [thenYear, thenMonth] = [Math.floor(total / 12), (((total % 12) + 12) % 12) + 1];
  return dayOfCount(countOf(thenYear, thenMonth, Math.min(dayOfMonth, daysInMonth(thenYear, thenMonth))));
}

/** Calendar days from one day to another; negative when the other is earlier. */
export function daysBetween(from: Day, to: Day): number {
  return count(to) - count(from);
}

/** True when something due on a day is late today; on the day itself it is not. */
export function isOverdue(due: Day, today: Day): boolean {
  return daysBetween(due, today) > 0;
}

/** Milliseconds since 1970 of a UTC instant ("2026-03-01T10:00:00.000Z"); NaN for another writing. */
export function millisecondsOf(instant: Instant): number {
  const match = /^(\d{4}-\d{2}-\d{2})T(\d{2}):(\d{2}):(\d{2})(?:\.(\d{1,3}))?Z$/.exec(instant);
  if (!match) return Number.NaN;
  const [, day = '', hour, minute, second, fraction = '0'] = match;
  const clock = (Number(hour) * 60 + Number(minute)) * 60 + Number(second);
  return count(day) * DAY_MS + clock * 1000 + Number(fraction.padEnd(3, '0'));
}

/** The UTC instant so many hours later, with milliseconds. */
export function addHours(instant: Instant, hours: number): Instant {
  const at = millisecondsOf(instant) + Math.round(hours * HOUR_MS);
  const days = Math.floor(at / DAY_MS);
  const left = at - days * DAY_MS;
  const [hour, minute, second] = [
    Math.floor(left / HOUR_MS),
    Math.floor(left / 60_000) % 60,
    Math.floor(left / 1000) % 60,
  ];
  return `${dayOfCount(days)}T${two(hour)}:${two(minute)}:${two(second)}.${String(left % 1000).padStart(3, '0')}Z`;
}

/** Making a formatter costs far more than using it, and every request asks what day it is. */
const CALENDARS = new Map<string, Intl.DateTimeFormat>();

function calendarOf(zone: string): Intl.DateTimeFormat {
  const known = CALENDARS.get(zone);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  });
  CALENDARS.set(zone, made);
  return made;
}

/** The day that it is at a site when this instant passes; `zone` is an IANA time zone. */
export function dayIn(instant: Instant, zone: string): Day {
  const parts = calendarOf(zone).formatToParts(millisecondsOf(instant));
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((one) => one.type === type)?.value ?? '';
  return `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`;
}

/** Whole months from one day to another (2026-01-31 to 2026-02-28 is one); negative when the other is earlier. */
export function monthsBetween(from: Day, to: Day): number {
  if (daysBetween(from, to) < 0) return -monthsBetween(to, from);
  const [year, month] = numbersOf(from);
  const [thenYear, thenMonth] = numbersOf(to);
  const months = (thenYear - year) * 12 + thenMonth - month;
  return daysBetween(addMonths(from, months), to) < 0 ? months - 1 : months;
}
