/* The field sheet: lines to be seen, what was seen, and where it differs from what was signed. */
import { type Q } from '@engine/quantity';

/** One line of a field sheet, made from the signed revision. `key` is unique within the case. */
export type FieldLine = {
  key: string;
  document: string;
  order: number;
  group: string;
  label: string;
  /** What was signed: a quantity or a word. Absent where the line only asks what is there. */
  wants?: Q | string;
  photo: boolean;
  /** A difference here holds start-up. */
  holds: boolean;
};

export type CannotSee = { why: 'reach' | 'painted' | 'insulated' | 'other'; means: string; second: string };

export type FieldEntry = {
  id: string;
  case: string;
  /** Key of the line. */
  line: string;
  as: 'installer' | 'verifier';
  installer?: string;
  seen?: Q | string;
  text?: string;
  files: string[];
  scan?: string;
  by: string;
  saw: string;
  got: string;
  device: string;
  shownAt?: string;
  cannot?: CannotSee;
};

export type Discrepancy = {
  id: string;
  number: number;
  entry: string;
  holds: boolean;
  state: 'open' | 'fixed' | 'seen-again' | 'sent-back' | 'accepted';
  owner: string;
  clears: string;
  finding?: string;
  posts: { by: string; at: string; text: string }[];
};

export type FieldFacts = {
  lines: readonly FieldLine[];
  entries: readonly FieldEntry[];
  discrepancies: readonly Discrepancy[];
};
