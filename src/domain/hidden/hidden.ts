/* For whom which cases and documents are hidden: the checker's view until their unseen check is complete and revealed. */
import { type Id, type Seat } from '@domain/case';

/** Marks a value that is withheld; it carries nothing else. */
export type Withheld = { hidden: true };
export const WITHHELD: Withheld = { hidden: true };

export type HiddenSet = { cases: ReadonlySet<Id>; documents: ReadonlySet<Id> };
export const NOTHING_HIDDEN: HiddenSet = { cases: new Set(), documents: new Set() };

export type HiddenFacts = {
  /** The person, and everyone they stand in for today. */
  persons: readonly Id[];
  /** Open cases of the site; `left` is `unseenLeft` of the case. */
  cases: readonly { case: Id; seats: readonly Seat[]; documents: readonly Id[]; left: boolean }[];
};

/**
 * Every case in which the person, or one they stand in for, holds a checker's seat and has something left to work unseen,
 * with all its documents: both truths of them, in force and working. It follows the person, whatever else they are.
 */
export function hiddenFor(facts: HiddenFacts): HiddenSet {
  const mine = facts.cases.filter(
    (each) =>
      each.left &&
      each.seats.some(
        (seat) => seat.role === 'checker' && !seat.until && facts.persons.includes(seat.person),
      ),
  );
  return {
    cases: new Set(mine.map((each) => each.case)),
    documents: new Set(mine.flatMap((each) => each.documents)),
  };
}

/** True when results of a document are withheld from the person. */
export function isHidden(hidden: HiddenSet, document: Id | undefined): boolean {
  return document !== undefined && hidden.documents.has(document);
}

/** True when the case is in the person's hidden view. */
export function isHiddenCase(hidden: HiddenSet, of: Id | undefined): boolean {
  return of !== undefined && hidden.cases.has(of);
}

/** A copy with the named fields withheld; the others stay. */
export function withhold<T extends object, K extends keyof T>(
  row: T,
  fields: readonly K[],
): Omit<T, K> & Record<K, Withheld> {
  const copy = { ...row } as Record<string, unknown>;
  for (const field of fields) copy[String(field)] = WITHHELD;
  return copy as Omit<T, K> & Record<K, Withheld>;
}

/** True for a value that was withheld. */
export function isWithheld(value: unknown): value is Withheld {
  return typeof value === 'object' && value !== null && 'hidden' in value && value.hidden === true;
}
