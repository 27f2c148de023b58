/* Rows of the unseen check, agreements and findings. */
import { type Q } from '@engine/quantity';
import {
  type Finding,
  type FindingWeight,
  type Hash,
  type Id,
  type Instant,
  type Path,
  type Rich,
  type SheetKey,
  type UnseenLayer,
} from '@domain/case';
import { table } from '../mapping';

/** An agreement, or, when it has `undoesId`, the undoing of one. */
export type AgreementRow = {
  id: Id;
  caseId: Id;
  documentId: Id;
  sheetKey: SheetKey;
  sheetHash: Hash;
  personId: Id;
  at: Instant;
  undoesId: Id | null;
};
/** What the checker entered; never changed: what it was compared with and how it was reconciled are rows of their own. */
export type UnseenRow = {
  id: Id;
  caseId: Id;
  documentId: Id;
  scope: Path;
  layer: UnseenLayer;
  quantity: string;
  value: Q | null;
  word: string | null;
  cites: string | null;
  round: number;
  byId: Id;
  at: Instant;
  firstView: Instant | null;
  /** The sheet of the checker's choice, and the external sheet, that a figure was worked on. */
  route: SheetKey | null;
  sheetId: Id | null;
};
/** A reveal: from here on the person sees the document's results; `sheets` are the governing sheets then, key → hash. */
export type RevealRow = {
  id: Id;
  caseId: Id;
  personId: Id;
  documentId: Id;
  round: number;
  sheets: Record<SheetKey, Hash>;
  at: Instant;
};
export type ComparisonRow = {
  entryId: Id;
  revealId: Id;
  against: Q | string | null;
  /** Relative difference, fraction of the originator's figure. */
  deviation: number | null;
  within: boolean;
  at: Instant;
};
export type ReconciliationRow = { id: Id; entryId: Id; byId: Id; at: Instant; text: Rich };
export type ViewRow = { id: Id; personId: Id; caseId: Id | null; documentId: Id; what: string; at: Instant };

export type FindingRow = {
  id: Id;
  caseId: Id;
  number: number;
  weight: FindingWeight;
  place: Path;
  state: Finding['state'];
  raisedBy: Id;
  raisedAt: Instant;
  successorId: Id | null;
  version: number;
};
export type FindingPostRow = { id: Id; findingId: Id; byId: Id; at: Instant; text: Rich; changePath: Path | null };

export const AGREEMENTS = table<AgreementRow>('agreements');
export const UNSEEN = table<UnseenRow>('unseen_entries', { json: ['value'] });
export const REVEALS = table<RevealRow>('reveals', { json: ['sheets'] });
export const COMPARISONS = table<ComparisonRow>('unseen_comparisons', { json: ['against'], flags: ['within'] });
export const RECONCILIATIONS = table<ReconciliationRow>('unseen_reconciliations', { json: ['text'] });
export const VIEWS = table<ViewRow>('views');
export const FINDINGS = table<FindingRow>('findings');
export const FINDING_POSTS = table<FindingPostRow>('finding_posts', { json: ['text'] });
