/* Rows about documents, their revisions, what pins an evaluation, and site rules. */
import { type Day, type Hash, type Id, type Instant } from '@domain/case';
import { table } from '../mapping';

export type DocumentKind = 'system' | 'header';
export type Grade = 'tag-only' | 'copied-in' | 'worked';
export type DocumentRow = {
  id: Id;
  siteId: Id;
  kind: DocumentKind;
  tag: string;
  name: string;
  unitId: Id;
  ownerId: Id | null;
  grade: Grade;
  inForceId: Id | null;
  retiredAt: Instant | null;
  version: number;
};
export type AliasRow = { id: Id; siteId: Id; kind: DocumentKind; tag: string; documentId: Id };

export type RevisionState = 'working' | 'approved' | 'in-force' | 'superseded' | 'dropped';
/** A revision without its body; read the body with `bodyOf`. */
export type RevisionRow = {
  id: Id;
  documentId: Id;
  number: number | null;
  state: RevisionState;
  caseId: Id | null;
  baseId: Id | null;
  documentHash: Hash | null;
  importsHash: Hash | null;
  rulesId: Id | null;
  evaluationKey: Hash | null;
  approvedAt: Instant | null;
  /** When the plant began to be as this revision says, and when that was known. */
  inPlantFrom: Instant | null;
  knownFrom: Instant | null;
  supersededAt: Instant | null;
  /** False: only its number and note are known, its body never was here. */
  held: boolean;
  note: string | null;
  version: number;
};
export type StoredRevision = RevisionRow & { body: Buffer | null };

/** An evaluation as it is kept; what figures, outcomes and sheets hold is the business of the service that wrote them. */
export type EvaluationRow = {
  key: Hash;
  documentHash: Hash;
  importsHash: Hash;
  judgementHash: Hash;
  catalogHash: Hash;
  engine: string;
  figures: unknown;
  outcomes: unknown;
  sheets: Buffer | null;
  at: Instant;
};
export type ImportSetRow = { hash: Hash; body: unknown };

export type RulesState = 'drafted' | 'half-signed' | 'signed' | 'in-effect' | 'superseded' | 'dropped';
export type SiteRulesRow = {
  id: Id;
  siteId: Id;
  number: number;
  state: RulesState;
  body: unknown;
  judgementHash: Hash;
  fromDay: Day;
  draftedBy: Id | null;
  version: number;
};

export const DOCUMENTS = table<DocumentRow>('documents');
export const ALIASES = table<AliasRow>('document_aliases');
export const REVISIONS = table<StoredRevision>('revisions', { flags: ['held'] });
export const EVALUATIONS = table<EvaluationRow>('evaluations', { json: ['figures', 'outcomes'] });
export const IMPORT_SETS = table<ImportSetRow>('import_sets', { json: ['body'] });
export const SITE_RULES = table<SiteRulesRow>('site_rules', { json: ['body'] });
