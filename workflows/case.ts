/* The case: its stages, and what may move it from one to the next. Pure; the services write the effects. */
import { type SnapshotFrom } from 'xstate';
import { type Stage } from '@domain/case';
import {
  approveAll,
  back,
  base,
  carryOn,
  dropAll,
  dropNamed,
  hold,
  issueAll,
  issueNamed,
  loseEnd,
  recordActed,
  release,
  removeNamed,
  reopen,
  takeEnd,
  withdraw,
} from './case-steps';
import { type CaseContext, type CaseEvent } from './case-types';
import { next, type Next } from './next';

export * from './case-types';
export { toRemove } from './case-guards';

export const caseMachine = base.createMachine({
  id: 'case',
  context: ({ input }) => input,
  initial: 'draft',
  states: {
    draft: {
      on: {
        PASS: [
          { guard: 'passDraft', target: 'scenarios', actions: ['sign', 'makeWorkingRevisions'] },
          {
            guard: 'passDraftGraded',
            target: 'in-force',
            actions: ['signGrade', 'issueRevisions', 'makeVerifyOnTouchItems', issueAll],
          },
        ],
        AUTHORISE: {
          guard: 'authorise',
          target: 'scenarios',
          actions: ['recordAuthorisation', 'makeWorkingRevisions', 'makeEmergencyDueItems'],
        },
        CARRY_OVER: { guard: 'carry', actions: ['carryOver'] },
        HOLD: hold('draft'),
        WITHDRAW: [...withdraw],
      },
    },
    scenarios: {
      on: {
        PASS: { guard: 'passScenarios', target: 'check', actions: ['sign'] },
        RETURN: { guard: 'ownToDraft', target: 'draft', actions: [...back] },
        CARRY_OVER: { guard: 'carry', actions: ['carryOver'] },
        RECORD_ACTED: recordActed,
        HOLD: hold('scenarios'),
        WITHDRAW: [...withdraw],
      },
    },
    check: {
      on: {
        PASS: { guard: 'passCheck', target: 'approval', actions: ['sign'] },
        RETURN: [
          { guard: 'checkToScenarios', target: 'scenarios', actions: [...back] },
          { guard: 'checkToDraft', target: 'draft', actions: [...back] },
          { guard: 'ownToScenarios', target: 'scenarios', actions: [...back] },
          { guard: 'ownToDraft', target: 'draft', actions: [...back] },
        ],
        REOPEN: { guard: 'reopenScenarios', target: 'scenarios', actions: [...reopen] },
        CARRY_OVER: [...carryOn],
        RECORD_ACTED: recordActed,
        HOLD: hold('check'),
        WITHDRAW: [...withdraw],
      },
    },
    approval: {
      on: {
        SIGN: [
          { guard: 'signNotLast', actions: ['sign', 'makeRequirements', 'signDeficiencies'] },
          {
            guard: 'signLastPlant',
            target: 'field',
            actions: [
              'sign',
              'makeRequirements',
              'signDeficiencies',
              'approveRevisions',
              'makeFieldLines',
              approveAll,
            ],
          },
          {
            guard: 'signLastNoPlant',
            target: 'in-force',
            actions: [
              'sign',
              'makeRequirements',
              'signDeficiencies',
              'issueRevisions',
              'tellAffectedCases',
              'makeDueItemsAfterStartUp',
              issueAll,
            ],
          },
        ],
        REFUSE: [
          { guard: 'refuse', target: 'refused', actions: ['recordReason', 'dropRevisions', dropAll] },
          { guard: 'refuseActed', target: 'due-for-removal', actions: ['recordReason', 'makeRemovalDue'] },
        ],
        RETURN: [
          { guard: 'approvalToCheck', target: 'check', actions: [...back] },
          { guard: 'approvalToScenarios', target: 'scenarios', actions: [...back] },
          { guard: 'approvalToDraft', target: 'draft', actions: [...back] },
        ],
        REOPEN: [
          { guard: 'reopenScenarios', target: 'scenarios', actions: [...reopen] },
          { guard: 'reopenCheck', target: 'check', actions: [...reopen] },
        ],
        CARRY_OVER: [...carryOn],
        RECORD_ACTED: recordActed,
        HOLD: hold('approval'),
        WITHDRAW: [...withdraw],
      },
    },
    field: {
      on: {
        ISSUE: [
          {
            guard: 'issueNotLast',
            actions: ['sign', 'issueRevision', 'tellAffectedCases', issueNamed],
          },
          {
            guard: 'issueLast',
            target: 'in-force',
            actions: ['sign', 'issueRevision', 'tellAffectedCases', 'makeDueItemsAfterStartUp', issueNamed],
          },
        ],
        DROP: [
          { guard: 'dropNotLast', actions: ['recordReason', 'dropRevision', dropNamed] },
          { guard: 'dropLast', target: 'in-force', actions: ['recordReason', 'dropRevision', dropNamed] },
        ],
        RETURN: [
          { guard: 'fieldToApproval', target: 'approval', actions: [...back] },
          { guard: 'fieldToCheck', target: 'check', actions: [...back] },
          { guard: 'fieldToScenarios', target: 'scenarios', actions: [...back] },
          { guard: 'fieldToDraft', target: 'draft', actions: [...back] },
        ],
        REOPEN: [
          { guard: 'reopenScenarios', target: 'scenarios', actions: [...reopen] },
          { guard: 'reopenCheck', target: 'check', actions: [...reopen] },
          { guard: 'reopenApproval', target: 'approval', actions: [...reopen] },
        ],
        CARRY_OVER: [...carryOn],
        RECORD_ACTED: recordActed,
        HOLD: hold('field'),
        WITHDRAW: [...withdraw],
      },
    },
    'in-force': {
      on: {
        FALL_DUE: { guard: 'fallDue', target: 'due-for-removal', actions: ['makeRemovalRevision'] },
        EXTEND: { guard: 'extend', actions: ['sign', 'setEnd', takeEnd] },
        KEEP: { guard: 'keep', actions: ['liftEnd', 'closeRemovalDue', loseEnd] },
      },
    },
    'due-for-removal': {
      on: {
        EXTEND: {
          guard: 'extendIssued',
          target: 'in-force',
          actions: ['sign', 'setEnd', 'dropRemovalRevision', takeEnd],
        },
        KEEP: [
          {
            guard: 'keepIssued',
            target: 'in-force',
            actions: ['liftEnd', 'dropRemovalRevision', 'closeRemovalDue', loseEnd],
          },
          { guard: 'keepNeverIssued', target: 'removed', actions: ['liftEnd', 'closeRemovalDue', loseEnd] },
        ],
        REMOVE: [
          { guard: 'removeNotLast', actions: ['sign', 'issueRemovalRevision', removeNamed] },
          {
            guard: 'removeLast',
            target: 'removed',
            actions: ['sign', 'issueRemovalRevision', 'closeRemovalDue', removeNamed],
          },
        ],
      },
    },
    'on-hold': {
      on: {
        RESUME: [
          { guard: 'resumeDraft', target: 'draft', actions: ['resumeClocks', release] },
          { guard: 'resumeScenarios', target: 'scenarios', actions: ['resumeClocks', release] },
          { guard: 'resumeCheck', target: 'check', actions: ['resumeClocks', release] },
          { guard: 'resumeApproval', target: 'approval', actions: ['resumeClocks', release] },
          { guard: 'resumeField', target: 'field', actions: ['resumeClocks', release] },
        ],
        WITHDRAW: withdraw[0],
      },
    },
    removed: { type: 'final' },
    withdrawn: { type: 'final' },
    refused: { type: 'final' },
  },
});

export type CaseSnapshot = SnapshotFrom<typeof caseMachine>;

/** The snapshot of a case that stands in a stage; context is taken from the rows of the case, so it is never behind them. */
export function caseSnapshot(stage: Stage, context: CaseContext): CaseSnapshot {
  return caseMachine.resolveState({ value: stage, context });
}

/** The snapshot of a case just raised. */
export function initialSnapshot(context: CaseContext): CaseSnapshot {
  return caseSnapshot('draft', context);
}

/** The stage a snapshot stands in. */
export function stageOf(snapshot: CaseSnapshot): Stage {
  return snapshot.value;
}

/** One act of a case: whether it may happen, the stage after it, and the effects to write in the same transaction. */
export function nextCase(snapshot: CaseSnapshot, event: CaseEvent): Next<typeof caseMachine> {
  return next(caseMachine, snapshot, event);
}
