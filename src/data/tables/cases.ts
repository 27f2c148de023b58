/* Rows about cases, signatures and due items. */
import {
  type BoundPart,
  type Brief,
  type CaseClass,
  type CaseDocumentState,
  type Day,
  type DueItem,
  type DueKind,
  type Extension,
  type Hash,
  type Id,
  type Instant,
  type Path,
  type SeatRole,
  type SheetKey,
  type Stage,
} from '@domain/case';
import { table } from '../mapping';

export type Authorised = { by: Id; how: 'spoken' | 'signed'; recordedBy: Id; at: Instant; words: string };
export type CaseRow = {
  id: Id;
  siteId: Id;
  number: string;
  title: string;
  class: CaseClass;
  stage: Stage;
  heldFrom: Stage | null;
  /** The machine's persisted snapshot. */
  snapshot: unknown;
  brief: Brief;
  briefHash: Hash;
  startsOn: Day | null;
  endsOn: Day | null;
  actedAt: Instant | null;
  closedAt: Instant | null;
  raisedBy: Id;
  raisedAt: Instant;
  /** Since when it has been at its stage. */
  stageAt: Instant;
  copiedFrom: Id | null;
  replacesId: Id | null;
  rulesId: Id | null;
  authorised: Authorised | null;
  extensions: Extension[];
  version: number;
};
export type CaseDocumentRow = {
  caseId: Id;
  documentId: Id;
  why: 'own' | 'affected';
  baseId: Id | null;
  workingId: Id | null;
  state: CaseDocumentState;
  actedAt: Instant | null;
};
export type SeatRow = {
  id: Id;
  caseId: Id;
  role: SeatRole;
  personId: Id;
  part: SheetKey[] | null;
  fromAt: Instant;
  untilAt: Instant | null;
};
export type AffectedRow = {
  id: Id;
  caseId: Id;
  documentId: Id;
  why: string[];
  figuresHash: Hash;
  answer: 'included' | 'not-affected' | null;
  reason: string | null;
  byId: Id | null;
  at: Instant | null;
  version: number;
};
export type QuestionRow = {
  id: Id;
  siteId: Id;
  askedBy: Id;
  at: Instant;
  changes: unknown;
  result: unknown;
  caseId: Id | null;
};

export type SignatureRow = {
  id: Id;
  caseId: Id | null;
  rulesId: Id | null;
  documentId: Id | null;
  gate: string;
  personId: Id;
  name: string;
  role: string;
  meaning: string;
  at: Instant;
  zone: string;
  bound: BoundPart[];
  contentHash: Hash;
  pageHash: Hash;
  factor: 'password' | 'password+code';
  forId: Id | null;
};
export type VoidRow = { id: Id; signatureId: Id; at: Instant; cause: string; trailId: Id | null };

export type DueRow = {
  id: Id;
  siteId: Id;
  kind: DueKind;
  caseId: Id | null;
  documentId: Id | null;
  subject: Path | null;
  text: string;
  ownerId: Id;
  due: Day;
  dueAt: Instant | null;
  closes: string | null;
  bars: 'extension' | 'start-up' | null;
  state: DueItem['state'];
  evidence: NonNullable<DueItem['evidence']> | null;
  interim: unknown;
  outcome: Hash | null;
  askedBy: Id;
  askedAt: Instant;
  signatureId: Id | null;
  version: number;
};
export type DueEventRow = { id: Id; dueId: Id; at: Instant; byId: Id | null; event: string; text: string | null };

export const CASES = table<CaseRow>('cases', { json: ['snapshot', 'brief', 'authorised', 'extensions'] });
export const CASE_DOCUMENTS = table<CaseDocumentRow>('case_documents');
export const SEATS = table<SeatRow>('seats', { json: ['part'] });
export const AFFECTED = table<AffectedRow>('affected', { json: ['why'] });
export const QUESTIONS = table<QuestionRow>('questions', { json: ['changes', 'result'] });
export const SIGNATURES = table<SignatureRow>('signatures', { json: ['bound'] });
export const VOIDS = table<VoidRow>('signature_voids');
export const DUE_ITEMS = table<DueRow>('due_items', { json: ['evidence', 'interim'] });
export const DUE_EVENTS = table<DueEventRow>('due_events');
