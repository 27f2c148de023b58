/* What a gate reads: the case and its records as plain data, gathered by the caller. */
import { type Basis, type Path } from '@domain/basis';
import { type Evaluation } from '@domain/evaluate';
import { type Q } from '@engine/quantity';
import { type FieldFacts } from '@domain/field/types';
import { type OpenPoint } from '@domain/result';
import { type Outcome, type RuleGate } from '@domain/rulebook/types';
import {
  type Agreement,
  type Case,
  type CaseDocumentState,
  type Day,
  type DueItem,
  type Finding,
  type Id,
  type Instant,
  type Role,
  type SheetKey,
  type Signature,
  type UnseenEntry,
} from './types';

export const GATES = ['draft', 'scenarios', 'check', 'approval', 'field'] as const;
export type Gate = (typeof GATES)[number];

/** One system (or header, without `doc`) of the case. */
export type DocumentFacts = {
  document: Id;
  tag: string;
  state: CaseDocumentState;
  /** Revision the case began from, and the one in force now. */
  base: Id;
  inForce?: Id;
  /** Number of another case whose signed revision waits to be installed on this system. */
  pendingCase?: string;
  doc?: Basis;
  baseDoc?: Basis;
  evaluation?: Evaluation;
  baseEvaluation?: Evaluation;
  outcomes: readonly Outcome[];
  /** Live figures in texts, bounds and copied figures that no longer agree. */
  stale?: readonly { path: Path; sentence: string }[];
  /** Undecided conflicts of a carry-over. */
  conflicts?: number;
  /** Corrections only: figures and verdicts that moved against the base. */
  moved?: readonly { path: Path; sentence: string }[];
  /** Emergencies only: how the change lowers relief capacity, as a sentence. */
  protectionCut?: string;
};

/** The parameters of conduct that gates read; keys as in the rulebook. */
export type GateRules = {
  approvers: number;
  affectedAnswerAge: number;
  temporaryMax: number;
  extensionsMax: number;
  approvalAge: number;
  shortfallMax: number;
  reasonLength: number;
  /** How much wider than the default the unseen tolerances are, at most 2. */
  unseenFactor?: number;
};

export type GateFacts = {
  today: Day;
  case: Case;
  /** Names of people and tags of documents by id. */
  names: Readonly<Record<Id, string>>;
  roles: Readonly<Record<Id, readonly Role[]>>;
  rules: GateRules;
  /** Gate of each rule of the rulebook by code; an unknown code counts as `scenarios`. */
  ruleGates: Readonly<Record<string, RuleGate>>;
  documents: readonly DocumentFacts[];
  signatures: readonly (Signature & { valid: boolean })[];
  agreements: readonly Agreement[];
  unseen: readonly UnseenEntry[];
  /** Governing sheets that the checker has been shown, with when. */
  reveals: readonly { document: Id; person: Id; at: Instant }[];
  findings: readonly Finding[];
  dueItems: readonly DueItem[];
  field: FieldFacts;
  /** Barometric pressure of the site, where a reading is absolute and what is signed is gauge. */
  barometer?: Q;
  authors: readonly { person: Id; document: Id; sheet: SheetKey }[];
  /** First look at the originator's figures, a person and a document. */
  views: readonly { person: Id; document: Id; at: Instant }[];
  /** Outcomes of rules that read the clock, people or the case, with the gate they hold. */
  caseOutcomes?: readonly (Outcome & { gate: Gate })[];
  /** True when the reader's view of this case is hidden: sentences then carry no figures. */
  hidden: boolean;
};

/** The link to a part of the case; the system is named when the case holds several. */
export function placeIn(facts: GateFacts, part: string, of?: DocumentFacts, anchor = ''): string {
  const several = facts.documents.length > 1 && of !== undefined;
  const query = several ? `?system=${encodeURIComponent(of.tag)}` : '';
  const hash = anchor === '' ? '' : `#${encodeURIComponent(anchor)}`;
  return `cases/${facts.case.number}/${part}${query}${hash}`;
}

/** The part of the case that shows a place of a document, with the place as anchor. */
export function placeOfPath(facts: GateFacts, of: DocumentFacts, path: Path): string {
  const [list = '', id = ''] = path.split('/');
  if (list === 'scenarios') return placeIn(facts, 'scenarios', of, id);
  if (list === 'sheets')
    return placeIn(facts, `sheets/${encodeURIComponent(path.slice(7).split('#')[0] ?? '')}`, of);
  if (list === 'lines' || list === 'segments') return placeIn(facts, 'lines', of, id);
  return placeIn(facts, 'changes', of, path);
}

/** An open point; one line instead of three. */
export function point(code: string, sentence: string, where: string): OpenPoint {
  return { code, sentence, where };
}

/** Name of a person or tag of a document, for sentences. */
export function nameOf(facts: GateFacts, id: Id): string {
  return facts.names[id] ?? facts.documents.find((each) => each.document === id)?.tag ?? 'someone';
}
