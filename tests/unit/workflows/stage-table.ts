/* The stage table of a case as rows that a test can try: from, act, by whom, to, effects, and what would refuse it. */
import { type Stage } from '@domain/case';
import { type CaseContext, type CaseEvent } from '@workflows/case';
import { type Actor } from '@workflows/actor';

export const originator: Actor = { id: 'p-o', roles: ['originator'], seats: ['originator'] };
export const checker: Actor = { id: 'p-c', roles: ['checker'], seats: ['checker'] };
export const approver: Actor = { id: 'p-a', roles: ['approver'], seats: ['approver'] };
export const outsideApprover: Actor = { id: 'p-b', roles: ['approver'], seats: [] };
export const operations: Actor = { id: 'p-p', roles: ['operations'], seats: ['operations'] };
export const ACTORS: Actor[] = [originator, checker, approver, outsideApprover, operations, 'system'];

export const point = {
  code: 'finding-open',
  sentence: 'Finding 1 must be settled first.',
  where: 'cases/1/findings',
};

export function context(over: Partial<CaseContext> = {}): CaseContext {
  return {
    class: 'permanent',
    graded: false,
    acted: false,
    extensions: 0,
    documents: [{ id: 'd1', state: 'open' }],
    removed: [],
    ...over,
  };
}
export const one = (state: 'open' | 'approved' | 'issued' | 'dropped') => [{ id: 'd1', state }];
export const two = (
  a: 'open' | 'approved' | 'issued' | 'dropped',
  b: 'open' | 'approved' | 'issued' | 'dropped',
) => [
  { id: 'd1', state: a },
  { id: 'd2', state: b },
];

type Fields = Record<string, unknown>;
/** An event with every field as its row would want it; `over` bends one. */
export function event(type: CaseEvent['type'], actor: Actor, over: Fields = {}): CaseEvent {
  return {
    type,
    actor,
    open: [],
    protectionKept: true,
    how: 'signed',
    last: true,
    plant: true,
    reason: 'The curve was read at the wrong speed.',
    document: 'd1',
    reached: true,
    begun: false,
    ends: '2026-12-31',
    mayExtend: true,
    successorIssued: true,
    to: 'scenarios',
    moved: true,
    clean: true,
    review: '2026-09-01',
    ...over,
  } as unknown as CaseEvent;
}

export type Row = {
  from: Stage[];
  act: CaseEvent['type'];
  by: Actor;
  to: Stage | 'same';
  context?: Partial<CaseContext>;
  over?: Fields;
  effects: string[];
  /** The same event refused: how the guard of the row is broken. */
  unless: { context?: Partial<CaseContext>; over?: Fields; by?: Actor }[];
};

const shut = { over: { open: [point] } };
export const temporary = { class: 'temporary', ends: '2026-09-30' } as const;
const emergency = { class: 'emergency' } as const;
const working: Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field'];

/** The stage table, row by row and in its order. */
// prettier-ignore
export const ROWS: Row[] = [
  { from: ['draft'], act: 'PASS', by: originator, to: 'scenarios', effects: ['sign', 'makeWorkingRevisions'], unless: [shut, { by: checker }, { context: { class: 'first-issue', graded: true } }] },
  { from: ['draft'], act: 'PASS', by: approver, to: 'in-force', context: { class: 'first-issue', graded: true }, effects: ['signGrade', 'issueRevisions', 'makeVerifyOnTouchItems'], unless: [shut, { by: originator }, { context: { class: 'first-issue', graded: false } }] },
  { from: ['draft'], act: 'AUTHORISE', by: outsideApprover, to: 'scenarios', context: emergency, effects: ['recordAuthorisation', 'makeWorkingRevisions', 'makeEmergencyDueItems'], unless: [{ over: { protectionKept: false } }, { context: { class: 'permanent' } }, { by: operations }] },
  { from: ['draft'], act: 'AUTHORISE', by: operations, to: 'scenarios', context: emergency, over: { how: 'spoken' }, effects: ['recordAuthorisation', 'makeWorkingRevisions', 'makeEmergencyDueItems'], unless: [{ over: { how: 'spoken', protectionKept: false } }, { by: checker }] },
  { from: ['scenarios'], act: 'PASS', by: originator, to: 'check', effects: ['sign'], unless: [shut, { by: approver }] },
  { from: ['check'], act: 'PASS', by: checker, to: 'approval', effects: ['sign'], unless: [shut, { by: originator }] },
  { from: ['approval'], act: 'SIGN', by: approver, to: 'approval', over: { last: false }, effects: ['sign', 'makeRequirements', 'signDeficiencies'], unless: [{ over: { last: false, open: [point] } }, { by: checker }] },
  { from: ['approval'], act: 'SIGN', by: approver, to: 'field', effects: ['sign', 'makeRequirements', 'signDeficiencies', 'approveRevisions', 'makeFieldLines'], unless: [shut, { by: outsideApprover }] },
  { from: ['approval'], act: 'SIGN', by: approver, to: 'in-force', over: { plant: false }, effects: ['sign', 'makeRequirements', 'signDeficiencies', 'issueRevisions', 'tellAffectedCases', 'makeDueItemsAfterStartUp'], unless: [{ over: { plant: false, open: [point] } }] },
  { from: ['approval'], act: 'REFUSE', by: approver, to: 'refused', effects: ['recordReason', 'dropRevisions'], unless: [{ over: { reason: ' ' } }, { by: checker }] },
  { from: ['approval'], act: 'REFUSE', by: approver, to: 'due-for-removal', context: { acted: true }, effects: ['recordReason', 'makeRemovalDue'], unless: [{ over: { reason: '' } }] },
  { from: ['field'], act: 'ISSUE', by: operations, to: 'field', context: { documents: two('approved', 'approved') }, effects: ['sign', 'issueRevision', 'tellAffectedCases'], unless: [shut, { by: approver }, { over: { document: 'd9' } }] },
  { from: ['field'], act: 'ISSUE', by: operations, to: 'in-force', context: { documents: two('approved', 'issued') }, effects: ['sign', 'issueRevision', 'tellAffectedCases', 'makeDueItemsAfterStartUp'], unless: [shut, { over: { document: 'd2' } }] },
  { from: ['field'], act: 'DROP', by: approver, to: 'field', context: { documents: [...two('approved', 'issued'), { id: 'd3', state: 'approved' }] }, effects: ['recordReason', 'dropRevision'], unless: [{ over: { document: 'd2' } }, { context: { documents: two('approved', 'approved') } }] },
  { from: ['field'], act: 'DROP', by: approver, to: 'in-force', context: { documents: two('approved', 'issued') }, effects: ['recordReason', 'dropRevision'], unless: [{ context: { documents: one('approved') } }, { by: operations }] },
  { from: ['in-force'], act: 'FALL_DUE', by: 'system', to: 'due-for-removal', context: temporary, effects: ['makeRemovalRevision'], unless: [{ context: {} }, { over: { reached: false } }, { by: originator }] },
  { from: ['in-force'], act: 'EXTEND', by: outsideApprover, to: 'in-force', context: temporary, effects: ['sign', 'setEnd'], unless: [{ context: {} }, { over: { mayExtend: false } }, { by: operations }] },
  { from: ['due-for-removal'], act: 'EXTEND', by: outsideApprover, to: 'in-force', context: { ...temporary, documents: one('issued') }, effects: ['sign', 'setEnd', 'dropRemovalRevision'], unless: [{ context: { ...temporary, documents: one('open') } }, { over: { mayExtend: false } }] },
  { from: ['in-force'], act: 'KEEP', by: 'system', to: 'in-force', context: temporary, effects: ['liftEnd', 'closeRemovalDue'], unless: [{ over: { successorIssued: false } }, { context: {} }, { by: approver }] },
  { from: ['due-for-removal'], act: 'KEEP', by: 'system', to: 'in-force', context: { documents: one('issued') }, effects: ['liftEnd', 'dropRemovalRevision', 'closeRemovalDue'], unless: [{ over: { successorIssued: false } }] },
  { from: ['due-for-removal'], act: 'KEEP', by: 'system', to: 'removed', context: { acted: true }, effects: ['liftEnd', 'closeRemovalDue'], unless: [{ over: { successorIssued: false } }] },
  { from: ['due-for-removal'], act: 'REMOVE', by: operations, to: 'due-for-removal', context: { documents: two('issued', 'issued') }, effects: ['sign', 'issueRemovalRevision'], unless: [shut, { by: approver }, { context: { documents: two('issued', 'issued'), removed: ['d1'] } }] },
  { from: ['due-for-removal'], act: 'REMOVE', by: operations, to: 'removed', context: { documents: two('issued', 'issued'), removed: ['d2'] }, effects: ['sign', 'issueRemovalRevision', 'closeRemovalDue'], unless: [shut] },
  { from: ['scenarios', 'check'], act: 'RETURN', by: originator, to: 'draft', over: { to: 'draft' }, effects: ['voidSignatures', 'reviveWorkingRevisions', 'recordReason'], unless: [{ over: { to: 'draft', reason: '' } }, { over: { to: 'approval' } }, { by: operations }] },
  { from: ['check'], act: 'RETURN', by: checker, to: 'scenarios', effects: ['voidSignatures', 'reviveWorkingRevisions', 'recordReason'], unless: [{ over: { to: 'check' } }, { by: approver }] },
  { from: ['approval'], act: 'RETURN', by: approver, to: 'check', over: { to: 'check' }, effects: ['voidSignatures', 'reviveWorkingRevisions', 'recordReason'], unless: [{ over: { to: 'field' } }, { by: checker }] },
  { from: ['field'], act: 'RETURN', by: operations, to: 'approval', context: { documents: one('approved') }, over: { to: 'approval' }, effects: ['voidSignatures', 'reviveWorkingRevisions', 'recordReason'], unless: [{ over: { to: 'in-force' } }, { by: approver }] },
  { from: ['check', 'approval', 'field'], act: 'REOPEN', by: 'system', to: 'scenarios', effects: ['voidSignatures', 'reviveWorkingRevisions'], unless: [{ over: { moved: false } }, { by: originator }, { over: { to: 'draft' } }] },
  { from: ['approval', 'field'], act: 'REOPEN', by: 'system', to: 'check', over: { to: 'check' }, effects: ['voidSignatures', 'reviveWorkingRevisions'], unless: [{ over: { to: 'check', moved: false } }] },
  { from: ['field'], act: 'REOPEN', by: 'system', to: 'approval', over: { to: 'approval' }, effects: ['voidSignatures', 'reviveWorkingRevisions'], unless: [{ over: { to: 'field' } }] },
  { from: ['check', 'approval', 'field'], act: 'CARRY_OVER', by: originator, to: 'check', effects: ['carryOver', 'voidSignatures', 'reviveWorkingRevisions'], unless: [{ by: checker }] },
  { from: ['check', 'approval', 'field'], act: 'CARRY_OVER', by: originator, to: 'scenarios', over: { clean: false }, effects: ['carryOver', 'voidSignatures', 'reviveWorkingRevisions'], unless: [{ by: 'system' }] },
  { from: ['draft', 'scenarios'], act: 'CARRY_OVER', by: originator, to: 'same', effects: ['carryOver'], unless: [{ by: approver }] },
  { from: working, act: 'HOLD', by: originator, to: 'on-hold', effects: ['recordReason', 'pauseClocks'], unless: [{ context: { acted: true } }, { over: { reason: '' } }, { by: operations }] },
  { from: working, act: 'HOLD', by: approver, to: 'on-hold', effects: ['recordReason', 'pauseClocks'], unless: [{ by: outsideApprover }] },
  ...working.map((stage): Row => ({ from: ['on-hold'], act: 'RESUME', by: approver, to: stage, context: { heldFrom: stage }, effects: ['resumeClocks'], unless: [{ by: checker }, { context: {} }] })),
  { from: [...working, 'on-hold'], act: 'WITHDRAW', by: originator, to: 'withdrawn', effects: ['recordReason', 'dropRevisions'], unless: [{ context: { documents: one('issued') } }, { by: approver }, { over: { reason: '' } }] },
  { from: working, act: 'WITHDRAW', by: originator, to: 'due-for-removal', context: { acted: true }, effects: ['recordReason', 'makeRemovalDue'], unless: [{ context: { acted: true, documents: one('issued') } }] },
  { from: ['scenarios', 'check', 'approval', 'field'], act: 'RECORD_ACTED', by: operations, to: 'same', context: emergency, effects: ['recordActed'], unless: [{ context: {} }, { by: originator }] },
];
