/* Context, events and effects of the case machine. */
import { type CaseClass, type CaseDocumentState, type Stage } from '@domain/case';
import { type OpenPoint } from '@domain/result';
import { type Actor } from './actor';

export type MachineDocument = { id: string; state: CaseDocumentState };

export type CaseContext = {
  class: CaseClass;
  /** A first issue as tag only or copied in: one signature of an approver issues it. */
  graded: boolean;
  /** Operations acted on an emergency before it was approved. */
  acted: boolean;
  /** Day on which the change ends; absent for what lasts. */
  ends?: string;
  extensions: number;
  heldFrom?: Stage;
  documents: MachineDocument[];
  /** Documents whose removal is in force. */
  removed: string[];
};

type By = { actor: Actor };
/** A gate's event carries its open points: one is enough to refuse it. */
type Gate = By & { open: readonly OpenPoint[] };

export type CaseEvent =
  | ({ type: 'PASS' } & Gate)
  | ({ type: 'AUTHORISE'; protectionKept: boolean; how: 'spoken' | 'signed' } & By)
  /** `last`: no other approver's signature is missing. `plant`: something changes that a field sheet would see. */
  | ({ type: 'SIGN'; last: boolean; plant: boolean } & Gate)
  | ({ type: 'REFUSE'; reason: string } & By)
  | ({ type: 'ISSUE'; document: string } & Gate)
  | ({ type: 'DROP'; document: string; reason: string } & By)
  | ({ type: 'FALL_DUE'; reached: boolean; begun: boolean } & By)
  | ({ type: 'EXTEND'; ends: string; mayExtend: boolean } & By)
  | ({ type: 'KEEP'; successorIssued: boolean } & By)
  | ({ type: 'REMOVE'; document: string } & Gate)
  | ({ type: 'RETURN'; to: Stage; reason: string } & By)
  | ({ type: 'REOPEN'; to: Stage; moved: boolean } & By)
  /** `clean`: the merge has no conflict and makes no new outcome. */
  | ({ type: 'CARRY_OVER'; document: string; clean: boolean } & By)
  | ({ type: 'HOLD'; reason: string; review: string } & By)
  | ({ type: 'RESUME' } & By)
  | ({ type: 'WITHDRAW'; reason: string } & By)
  | ({ type: 'RECORD_ACTED'; document: string } & By);

export const CASE_EVENTS = [
  'PASS',
  'AUTHORISE',
  'SIGN',
  'REFUSE',
  'ISSUE',
  'DROP',
  'FALL_DUE',
  'EXTEND',
  'KEEP',
  'REMOVE',
  'RETURN',
  'REOPEN',
  'CARRY_OVER',
  'HOLD',
  'RESUME',
  'WITHDRAW',
  'RECORD_ACTED',
] as const satisfies readonly CaseEvent['type'][];

/** What the service writes when a step says so; each is one function of the services, in the order listed by the step. */
export const CASE_EFFECTS = [
  'sign',
  'signGrade',
  'makeWorkingRevisions',
  'recordAuthorisation',
  'makeEmergencyDueItems',
  'makeVerifyOnTouchItems',
  'signDeficiencies',
  'makeRequirements',
  'approveRevisions',
  'makeFieldLines',
  'issueRevision',
  'issueRevisions',
  'tellAffectedCases',
  'makeDueItemsAfterStartUp',
  'dropRevision',
  'dropRevisions',
  'recordReason',
  'makeRemovalDue',
  'makeRemovalRevision',
  'dropRemovalRevision',
  'issueRemovalRevision',
  'setEnd',
  'liftEnd',
  'closeRemovalDue',
  'voidSignatures',
  'reviveWorkingRevisions',
  'carryOver',
  'pauseClocks',
  'resumeClocks',
  'recordActed',
] as const;
export type CaseEffect = (typeof CASE_EFFECTS)[number];
