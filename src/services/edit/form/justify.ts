/* What a form writes beside an outcome or an external sheet: a justification tied to it, or that its figures were made anew. */
import { type Basis, type Justification, type Op } from '@domain/basis';
import { richOfField } from '@domain/case';
import { externalInputsHash } from '@domain/evaluate';
import { type Outcome } from '@domain/rulebook';
import { type Rich } from '@domain/text';
import { newId } from '@data/ids';
import { own } from './fields';

type Typed = readonly (readonly [string, string])[];
type By = { person: string; on: string };

/** A justification of the outcome named by its hash; it takes the place of an older one for the same rule and place. */
export function readJustification(document: Basis, outcomes: readonly Outcome[], typed: Typed, by: By): Op[] {
  const hash = own(typed, 'justify');
  const outcome = outcomes.find((one) => one.hash === hash);
  if (!outcome) return [];
  const value: Justification = {
    id: newId('element'),
    code: outcome.code,
    subject: outcome.subject,
    values: outcome.values,
    hash: outcome.hash,
    text: richOfField(own(typed, 'justification') ?? '') as Rich,
    by: by.person,
    on: by.on,
  };
  const older = document.justifications
    .filter((one) => one.code === outcome.code && one.subject === outcome.subject)
    .map((one): Op => ({ op: 'remove', path: `justifications/${one.id}`, was: one }));
  return [...older, { op: 'add', path: 'justifications', value }];
}

/** External sheets whose figures are said to be made with the inputs as they stand. `after` is the document with the other changes made. */
export function readMadeOf(after: Basis, typed: Typed): Op[] {
  const named = typed.filter(([name]) => name === 'made').map(([, id]) => id);
  return after.externalSheets
    .filter((one) => named.includes(one.id))
    .map((one): Op => ({
      op: 'set',
      path: `externalSheets/${one.id}/madeOf`,
      value: externalInputsHash(after, one),
    }));
}
