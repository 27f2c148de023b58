/* The classes of case that can be raised in this installation, with what each means. */
import { type CaseClass } from '@domain/case';

export type RaisableClass = { value: CaseClass; label: string; note: string };

export const RAISABLE: readonly RaisableClass[] = [
  { value: 'permanent', label: 'Permanent', note: 'Stays until another case changes it.' },
  {
    value: 'correction',
    label: 'Correction',
    note: 'The record was wrong; no result, limit or verdict moves.',
  },
  { value: 'revalidation', label: 'Revalidation', note: 'Nothing changes; examined and signed again.' },
];

/** Said beside the choice, and when another class is asked for. */
export const RAISABLE_SENTENCE =
  'This installation handles permanent changes, corrections and revalidations.';

/** True for a class that can be raised here. */
export function isRaisable(kind: CaseClass): boolean {
  return RAISABLE.some((one) => one.value === kind);
}
