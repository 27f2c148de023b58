/* The records of a case: brief, seats, signatures, unseen check, findings, due items, notices and the trail. */
import { type Q } from '@engine/quantity';
import { type Brief } from './brief';
import { type Day, type Hash, type Id, type Instant, type Path, type Rich, type SheetKey } from './scalars';

export type { Day, Hash, Id, Instant, Path, Rich, SheetKey } from './scalars';

export const STAGES = [
  'draft',
  'scenarios',
  'check',
  'approval',
  'field',
  'in-force',
  'due-for-removal',
  'removed',
  'on-hold',
  'withdrawn',
  'refused',
] as const;
export type Stage = (typeof STAGES)[number];

export const CASE_CLASSES = [
  'permanent',
  'temporary',
  'emergency',
  'first-issue',
  'correction',
  'revalidation',
] as const;
export type CaseClass = (typeof CASE_CLASSES)[number];

/** Roles are given per site; the site coordinator's gives no act of a case. */
export const ROLES = ['originator', 'checker', 'approver', 'operations', 'coordinator', 'auditor'] as const;
export type Role = (typeof ROLES)[number];

export const SEAT_ROLES = ['originator', 'checker', 'approver', 'operations'] as const;
export type SeatRole = (typeof SEAT_ROLES)[number];

export type Seat = { id: Id; role: SeatRole; person: Id; part?: SheetKey[]; until?: Instant };
export type CaseDocumentState = 'open' | 'approved' | 'issued' | 'dropped';
export type CaseDocument = {
  document: Id;
  why: 'own' | 'affected';
  base: Id;
  working: Id;
  state: CaseDocumentState;
  actedAt?: Instant;
};
export type Affected = {
  document: Id;
  why: string[];
  hash: Hash;
  answer?: 'included' | 'not-affected';
  reason?: string;
  by?: Id;
  at?: Instant;
};
export type Extension = { askedBy: Id; ends: Day; reason: string; signature?: Id };

export type Case = {
  id: Id;
  number: string;
  class: CaseClass;
  stage: Stage;
  heldFrom?: Stage;
  brief: Brief;
  raisedBy: Id;
  raisedAt: Instant;
  version: number;
  rules: number;
  copiedFrom?: Id;
  replaces?: Id;
  documents: CaseDocument[];
  seats: Seat[];
  affected: Affected[];
  authorised?: { by: Id; how: 'spoken' | 'signed'; recordedBy: Id; at: Instant; words: string };
  extensions: Extension[];
};

export type BoundPart = {
  part: 'brief' | 'document' | 'imports' | 'rules' | 'evaluation' | 'unseen' | 'findings' | 'field-sheet';
  of: Id;
  hash: Hash;
};
export type Signature = {
  id: Id;
  case?: Id;
  rules?: Id;
  /** A case issues its systems one by one: the gates `field` and `removal` are signed for one document. */
  document?: Id;
  gate: string;
  person: Id;
  name: string;
  role: string;
  meaning: string;
  at: Instant;
  zone: string;
  page: Hash;
  hash: Hash;
  bound: BoundPart[];
  factor: 'password' | 'password+code';
  for?: Id;
};
export type Agreement = {
  case: Id;
  document: Id;
  sheet: SheetKey;
  hash: Hash;
  by: Id;
  at: Instant;
  undone?: Instant;
};
export type UnseenLayer = 'reading' | 'choice' | 'figure';
export type UnseenEntry = {
  id: Id;
  case: Id;
  document: Id;
  scope: Path;
  layer: UnseenLayer;
  quantity: string;
  value?: Q;
  word?: string;
  cites?: string;
  round: number;
  by: Id;
  at: Instant;
  firstView?: Instant;
  route?: SheetKey;
  sheet?: Id;
  against?: Q | string;
  deviation?: number;
  reconciled?: { text: Rich; by: Id; at: Instant };
};
export type FindingWeight = 'must-fix' | 'should-fix' | 'remark' | 'question';
export type Finding = {
  id: Id;
  case: Id;
  number: number;
  weight: FindingWeight;
  place: Path;
  state: 'open' | 'answered' | 'closed';
  raisedBy: Id;
  successor?: Id;
  posts: { by: Id; at: Instant; text: Rich; change?: Path }[];
};

export const DUE_KINDS = [
  'start-up',
  'approval-requirement',
  'pssr',
  'training',
  'paper',
  'deficiency',
  'answer',
  'confirmation',
  'analysis',
  'check',
  'removal',
  'revalidation',
  'moved-result',
  'own-note',
] as const;
export type DueKind = (typeof DUE_KINDS)[number];
export type DueItem = {
  id: Id;
  kind: DueKind;
  case?: Id;
  document?: Id;
  subject?: Path;
  text: string;
  owner: Id;
  due: Day;
  dueAt?: Instant;
  closes?: string;
  bars?: 'extension' | 'start-up';
  state: 'open' | 'done' | 'accepted' | 'waived';
  evidence?: { text?: string; file?: Id; case?: Id };
  interim?: Rich;
  outcome?: Hash;
  asked: { by: Id; at: Instant };
  signature?: Id;
};
export type Impairment = {
  id: Id;
  point: Id;
  from: Instant;
  until: Instant;
  by: Id;
  cover: 'substitute' | 'vented' | 'attendant' | 'none';
  substitute?: Id;
  attendant?: string;
  handovers: { at: Instant; by: Id }[];
  ended?: Instant;
};
export type Notice = {
  id: Id;
  event: string;
  to: Id;
  case?: Id;
  urgency: 'at-once' | 'digest';
  subject: string;
  body: string;
  state: 'queued' | 'sending' | 'delivered' | 'failed' | 'dead';
  after: Instant;
  tries: number;
  message: string;
};
export type TrailEntry = {
  site: Id;
  seq: number;
  at: Instant;
  act: string;
  by: Id | 'system';
  seat?: string;
  case?: Id;
  subject: string;
  why?: string;
  from?: string;
  changes: { path: Path; old?: unknown; new?: unknown }[];
  hides: boolean;
  prev: Hash;
  hash: Hash;
};
export type Attachment = {
  id: Id;
  file: Id;
  of: string;
  path?: Path;
  caption?: string;
  shows: 'evidence' | 'result';
  by: Id;
  at: Instant;
};
