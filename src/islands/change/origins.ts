/* Kinds of origin that a person may state; a copied figure is made by copying, never by typing. */
import { type Origin } from '@domain/basis';

export const ORIGINS: readonly { kind: Exclude<Origin['kind'], 'figure'>; words: string }[] = [
  { kind: 'drawing', words: 'Drawing' },
  { kind: 'data-sheet', words: 'Data sheet' },
  { kind: 'maker', words: 'Maker' },
  { kind: 'plate', words: 'Nameplate' },
  { kind: 'test-record', words: 'Test record' },
  { kind: 'field-reading', words: 'Field reading' },
  { kind: 'simulation', words: 'Simulation' },
  { kind: 'calculation', words: 'Calculation' },
  { kind: 'judgement', words: 'Judgement' },
];
