/* Due dates: days, working days, months, hours. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addDays,
  addHours,
  addMonths,
  addWorkingDays,
  dayIn,
  daysBetween,
  isDay,
  isOverdue,
  isWorkingDay,
  monthsBetween,
  weekdayOf,
} from '@domain/dates';

const aDay = fc.integer({ min: -200_000, max: 200_000 }).map((days) => addDays('2026-01-01', days));

describe('days', () => {
  it('count through leap years', () => {
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2026-02-28', 1)).toBe('2026-03-01');
    expect(addDays('2000-03-01', -1)).toBe('2000-02-29');
    expect(daysBetween('1999-12-31', '2000-12-31')).toBe(366);
  });

  it('agree with the calendar of the platform', () => {
    fc.assert(
      fc.property(aDay, fc.integer({ min: -5000, max: 5000 }), (day, days) => {
        const at = new Date(`${day}T00:00:00Z`);
        at.setUTCDate(at.getUTCDate() + days);
        expect(addDays(day, days)).toBe(at.toISOString().slice(0, 10));
        expect(daysBetween(day, addDays(day, days))).toBe(days);
        expect(weekdayOf(day)).toBe(new Date(`${day}T00:00:00Z`).getUTCDay());
      }),
    );
  });

  it('tell a day from another writing', () => {
    expect(['2026-02-28', '2026-02-30', '2026-2-1', '28.02.2026', '2026-13-01'].map(isDay)).toEqual([
      true,
      false,
      false,
      false,
      false,
    ]);
  });

  it('are overdue from the day after', () => {
    expect([isOverdue('2026-03-02', '2026-03-02'), isOverdue('2026-03-02', '2026-03-03')]).toEqual([
      false,
      true,
    ]);
  });
});

describe('working days', () => {
  it('skip Saturday and Sunday', () => {
    // 2026-03-06 is a Friday.
    expect(addWorkingDays('2026-03-06', 1)).toBe('2026-03-09');
    expect(addWorkingDays('2026-03-06', 5)).toBe('2026-03-13');
    expect(addWorkingDays('2026-03-07', 1)).toBe('2026-03-09');
    expect(addWorkingDays('2026-03-07', 0)).toBe('2026-03-09');
    expect(addWorkingDays('2026-03-06', 0)).toBe('2026-03-06');
  });

  it('end on a working day with as many between', () => {
    fc.assert(
      fc.property(aDay, fc.integer({ min: 1, max: 60 }), (day, days) => {
        const then = addWorkingDays(day, days);
        const between = Array.from({ length: daysBetween(day, then) }, (_, index) => addDays(day, index + 1));
        expect(isWorkingDay(then)).toBe(true);
        expect(between.filter(isWorkingDay)).toHaveLength(days);
      }),
    );
  });
});

describe('months and hours', () => {
  it('end on the last day of a shorter month', () => {
    expect(addMonths('2026-01-31', 1)).toBe('2026-02-28');
    expect(addMonths('2026-11-15', 3)).toBe('2027-02-15');
    expect(addMonths('2026-01-15', -1)).toBe('2025-12-15');
  });

  it('count whole months', () => {
    expect(monthsBetween('2026-01-31', '2026-02-28')).toBe(1);
    expect(monthsBetween('2026-01-31', '2026-02-27')).toBe(0);
    expect(monthsBetween('2027-03-01', '2026-03-01')).toBe(-12);
  });

  it('carry an instant over midnight', () => {
    expect(addHours('2026-12-31T22:30:00.250Z', 12)).toBe('2027-01-01T10:30:00.250Z');
    expect(addHours('2026-01-01T00:00:00Z', -0.5)).toBe('2025-12-31T23:30:00.000Z');
  });

  it('know which day it is at the site', () => {
    expect(dayIn('2026-06-30T22:30:00Z', 'Europe/Berlin')).toBe('2026-07-01');
    expect(dayIn('2026-06-30T22:30:00Z', 'America/Chicago')).toBe('2026-06-30');
  });
});
