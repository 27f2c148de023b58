/* What the reader may do here and why not, as the forms of a part ask for it. */
import { type Act, can, type On } from '@domain/case';
import { nameIn, onFile } from '../../case-file';
import { whoOf } from '../../context';
import { instantWords } from './when';
import { type OpenedCase } from './open';

/** Yes, or the reason why not. */
export type May = { ok: true } | { ok: false; whyNot: string; seated: boolean };

/**
 * Whether the reader may do an act of the case, with facts of the single act. `seated` says whether the reason is worth
 * telling: to someone without the role or the seat the form is simply not offered.
 */
export function mayHere(of: OpenedCase, act: Act, facts: Partial<On> = {}): May {
  const answer = can(whoOf(of.actor), act, { ...onFile(of.file), ...facts });
  return answer.ok
    ? { ok: true }
    : { ok: false, whyNot: answer.sentence, seated: answer.code !== 'NOT_PERMITTED' };
}

/** The name of anyone at the site or in the case. */
export function nameOf(of: OpenedCase, id: string): string {
  return of.facts.names[id] ?? nameIn(of.file, id);
}

/** A person and a time in words: "Ilse Fennimore, 21 Mar 2026 14:05". */
export function byAt(of: OpenedCase, by: string, at: string): string {
  return `${nameOf(of, by)}, ${instantWords(at, of.file.site.timeZone)}`;
}
