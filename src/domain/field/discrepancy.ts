/* A difference between what was seen and what was signed: what is recorded, and what would clear it. */
import { compareSeen, type Compared } from './compare';
import { type QuantityContext } from '@engine/quantity';
import { type Discrepancy, type FieldEntry, type FieldLine } from './types';

/** Facts of a discrepancy before it has an id and a number. */
export type NewDiscrepancy = Pick<Discrepancy, 'entry' | 'holds' | 'owner' | 'clears'> & { sentence: string };

/** The comparison of an entry with its line; nothing when the entry read nothing (then a second means is asked). */
export function comparedEntry(
  line: FieldLine,
  entry: FieldEntry,
  context?: QuantityContext,
): Compared | undefined {
  return entry.seen === undefined ? undefined : compareSeen(line, entry.seen, context);
}

/** The discrepancy that a verifier's entry makes, or nothing when it agrees. The owner is the one who saw it. */
export function discrepancyOf(
  line: FieldLine,
  entry: FieldEntry,
  context?: QuantityContext,
): NewDiscrepancy | undefined {
  const compared = comparedEntry(line, entry, context);
  if (!compared || compared.agrees || entry.as !== 'verifier') return undefined;
  return {
    entry: entry.id,
    holds: line.holds,
    owner: entry.by,
    clears: `Put it right and see it again, or send it back so that the case is changed.`,
    sentence: `${line.label}: ${compared.sentence}`,
  };
}

/** What is wrong with an entry as it stands; empty when it is complete. Nothing here tells what was signed. */
export function faultsOfEntry(line: FieldLine, entry: FieldEntry): string[] {
  const faults: string[] = [];
  if (entry.cannot) {
    if (entry.cannot.means.trim().length < 3)
      faults.push(`${line.label}: say by which second means it was established.`);
    if (entry.cannot.second === '' || entry.cannot.second === entry.by)
      faults.push(`${line.label}: what cannot be read needs a second person.`);
  } else if (entry.seen === undefined || (typeof entry.seen === 'string' && entry.seen.trim() === '')) {
    faults.push(`${line.label}: enter what is there, or say that it cannot be read.`);
  }
  if (line.photo && entry.files.length === 0) faults.push(`${line.label}: a photograph is asked for.`);
  return faults;
}
