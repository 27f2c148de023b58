/* The guards of the case machine: one for each row of the stage table, named by where it leads. */
import { type Act, type Stage } from '@domain/case';
import { permitted } from './actor';
import { type CaseContext, type CaseEvent } from './case-types';

type Args = { context: CaseContext; event: CaseEvent };
type Test = (args: Args) => boolean;

const all =
  (...tests: Test[]): Test =>
  (args) =>
    tests.every((test) => test(args));
const not =
  (test: Test): Test =>
  (args) =>
    !test(args);
const may =
  (...acts: Act[]): Test =>
  ({ event }) =>
    acts.some((act) => permitted(act, event.actor));

const bySystem: Test = ({ event }) => event.actor === 'system';
const gateOpen: Test = ({ event }) => 'open' in event && event.open.length === 0;
const graded: Test = ({ context }) => context.class === 'first-issue' && context.graded;
const acted: Test = ({ context }) => context.acted;
const hasEnd: Test = ({ context }) => context.ends !== undefined;
const issued: Test = ({ context }) => context.documents.some((document) => document.state === 'issued');
const reasoned: Test = ({ event }) => 'reason' in event && event.reason.trim() !== '';
const last: Test = ({ event }) => event.type === 'SIGN' && event.last;
const plant: Test = ({ event }) => event.type === 'SIGN' && event.plant;
const mayExtend: Test = ({ event }) => event.type === 'EXTEND' && event.mayExtend;
const succeeded: Test = ({ event }) => event.type === 'KEEP' && event.successorIssued;
const due: Test = ({ event }) => event.type === 'FALL_DUE' && (event.reached || event.begun);
const clean: Test = ({ event }) => event.type === 'CARRY_OVER' && event.clean;
const moved: Test = ({ event }) => event.type === 'REOPEN' && event.moved;
const to =
  (stage: Stage): Test =>
  ({ event }) =>
    (event.type === 'RETURN' || event.type === 'REOPEN') && event.to === stage;
const heldFrom =
  (stage: Stage): Test =>
  ({ context }) =>
    context.heldFrom === stage;

/** The document an event names, when the case holds it in one of these states. */
const named =
  (...states: string[]): Test =>
  ({ context, event }) =>
    'document' in event &&
    context.documents.some((document) => document.id === event.document && states.includes(document.state));
/** True when every other document of the case is issued or dropped. */
const othersSettled: Test = ({ context, event }) =>
  'document' in event &&
  context.documents.every(
    (document) => document.id === event.document || ['issued', 'dropped'].includes(document.state),
  );

/** What a removal undoes: the issued documents, or all of them when operations acted and none was issued. */
export function toRemove(context: CaseContext): string[] {
  const inForce = context.documents.filter((document) => document.state === 'issued');
  return (inForce.length > 0 ? inForce : context.documents).map((document) => document.id);
}
const removable: Test = ({ context, event }) =>
  'document' in event &&
  toRemove(context).includes(event.document) &&
  !context.removed.includes(event.document);
const lastRemoved: Test = ({ context, event }) =>
  'document' in event &&
  toRemove(context).every((document) => document === event.document || context.removed.includes(document));

const sign = all(may('SIGN'), gateOpen);
const issue = all(may('ISSUE'), gateOpen, named('approved'));
const drop = all(may('DROP'), issued, named('open', 'approved'), reasoned);
const remove = all(may('REMOVE'), gateOpen, removable);
const withdraw = all(may('WITHDRAW'), not(issued), reasoned);
const extend = all(may('EXTEND'), hasEnd, mayExtend);
const carry = may('CARRY_OVER');
const returned = (act: Act, stage: Stage): Test => all(may(act), to(stage), reasoned);
const reopened = (stage: Stage): Test => all(bySystem, moved, to(stage));

export const caseGuards = {
  passDraft: all(may('PASS-draft'), gateOpen, not(graded)),
  passDraftGraded: all(may('PASS-draft-graded'), gateOpen, graded),
  authorise: all(
    may('AUTHORISE', 'AUTHORISE-spoken'),
    ({ context }) => context.class === 'emergency',
    ({ event }) =>
      event.type === 'AUTHORISE' &&
      event.protectionKept &&
      permitted(event.how === 'spoken' ? 'AUTHORISE-spoken' : 'AUTHORISE', event.actor),
  ),
  passScenarios: all(may('PASS-scenarios'), gateOpen),
  passCheck: all(may('PASS-check'), gateOpen),
  signNotLast: all(sign, not(last)),
  signLastPlant: all(sign, last, plant),
  signLastNoPlant: all(sign, last, not(plant)),
  refuse: all(may('REFUSE'), reasoned, not(acted)),
  refuseActed: all(may('REFUSE'), reasoned, acted),
  issueNotLast: all(issue, not(othersSettled)),
  issueLast: all(issue, othersSettled),
  dropNotLast: all(drop, not(othersSettled)),
  dropLast: all(drop, othersSettled),
  fallDue: all(bySystem, hasEnd, due),
  extend,
  extendIssued: all(extend, issued),
  keep: all(bySystem, hasEnd, succeeded),
  keepIssued: all(bySystem, succeeded, issued),
  keepNeverIssued: all(bySystem, succeeded, not(issued)),
  removeNotLast: all(remove, not(lastRemoved)),
  removeLast: all(remove, lastRemoved),
  ownToDraft: returned('RETURN-own', 'draft'),
  ownToScenarios: returned('RETURN-own', 'scenarios'),
  checkToDraft: returned('RETURN-check', 'draft'),
  checkToScenarios: returned('RETURN-check', 'scenarios'),
  approvalToDraft: returned('RETURN-approval', 'draft'),
  approvalToScenarios: returned('RETURN-approval', 'scenarios'),
  approvalToCheck: returned('RETURN-approval', 'check'),
  fieldToDraft: returned('RETURN-field', 'draft'),
  fieldToScenarios: returned('RETURN-field', 'scenarios'),
  fieldToCheck: returned('RETURN-field', 'check'),
  fieldToApproval: returned('RETURN-field', 'approval'),
  reopenScenarios: reopened('scenarios'),
  reopenCheck: reopened('check'),
  reopenApproval: reopened('approval'),
  carry,
  carryClean: all(carry, clean),
  carryConflict: all(carry, not(clean)),
  hold: all(may('HOLD'), not(acted), reasoned),
  resumeDraft: all(may('RESUME'), heldFrom('draft')),
  resumeScenarios: all(may('RESUME'), heldFrom('scenarios')),
  resumeCheck: all(may('RESUME'), heldFrom('check')),
  resumeApproval: all(may('RESUME'), heldFrom('approval')),
  resumeField: all(may('RESUME'), heldFrom('field')),
  withdraw: all(withdraw, not(acted)),
  withdrawActed: all(withdraw, acted),
  recordActed: all(may('record-acted'), ({ context }) => context.class === 'emergency'),
} satisfies Record<string, Test>;
