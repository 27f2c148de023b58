/* What a result of a sheet is called wherever results that moved are told. */
import { type Basis } from '@domain/basis';
import { sheetLabel } from '@domain/projections';

/** Outputs in words, as a reader knows them. */
export const OUTPUT_WORDS: Readonly<Record<string, string>> = {
  relief_load: 'relief load',
  A_required: 'required area',
  P1: 'relieving pressure',
  relieving_pressure: 'relieving pressure',
  MAAP: 'allowed pressure',
  CDTP: 'cold differential test pressure',
  use: 'used of the installed area',
  total: 'total back pressure',
  rated: 'rated capacity',
  inletLoss: 'inlet loss',
  builtUp: 'built-up back pressure',
  required: 'required area',
  installed: 'installed area',
  verdict: 'verdict',
};
/** The output that a sheet of a kind is named after; its name says it already. */
const NAMED: Readonly<Record<string, string>> = {
  load: 'relief_load',
  size: 'A_required',
  rated: 'rated',
  cold: 'CDTP',
};

/**
 * The name of one output of a sheet.
 * @example resultLabel(basis, 'size:power/ans_g1', 'use') → "Required area, Power failure: used of the installed area"
 */
export function resultLabel(doc: Basis, key: string, output: string): string {
  const name = sheetLabel(doc, key);
  if (NAMED[key.split(':')[0] ?? ''] === output) return name;
  return `${name}: ${OUTPUT_WORDS[output] ?? output.replaceAll('_', ' ')}`;
}
