/* One call of the real service for each act that can be asked for: with nothing that could be written, so that only permission is judged. */
import { fail, type Result } from '@domain/result';
import { type Auth } from '@auth/index';
import { type Actor, type Ctx } from '@services/context';
import { workCases } from '@services/calculations';
import { addPerson } from '@services/administer/add-person';
import { agreeSheet, undoAgreement } from '@services/check/agree';
import { raiseFinding, turnFinding } from '@services/check/findings';
import { enterUnseen, reconcileUnseen, revealUnseen } from '@services/check/unseen';
import { askDue } from '@services/due/ask';
import { turnDue } from '@services/due/turn';
import { answerAffected } from '@services/edit/affected';
import { editBrief } from '@services/edit/brief';
import { editDocument } from '@services/edit/document';
import { copyCase, raiseCase } from '@services/edit/raise';
import { nominate } from '@services/edit/seats';
import { fixDiscrepancy, seeAgain, sendBack } from '@services/field/discrepancies';
import { enterField } from '@services/field/enter';
import { keepPhotograph } from '@services/field/photographs';
import { type StageAct, STAGE_ACTS } from '@services/stage/types';
import { stageAct } from '@services/stage/stage-act';
import { openCase } from '@services/views/case/open';

/** What was sent is refused by itself: reaching that refusal means that permission was passed. */
const NOTHING = {
  body: fail('SCHEMA', 'Nothing was sent.'),
  version: fail('VERSION_MISSING', 'No version was sent.'),
  once: fail('KEY_MISSING', 'No key was sent.'),
};

export type Probed = { ctx: Ctx; auth: Auth; actor: Actor; number: string; dueOf: (act: string) => string };
type Probe = (of: Probed) => Promise<Result<unknown>> | Result<unknown>;

const stage =
  (act: StageAct): Probe =>
  ({ ctx, auth, actor, number }) =>
    stageAct(ctx, auth, actor, { number, act, ip: '127.0.0.1', ...NOTHING });
const finding =
  (turn: 'answer-finding' | 'close-finding' | 'reopen-finding'): Probe =>
  ({ ctx, actor, number }) =>
    turnFinding(ctx, actor, { number, finding: 1, turn }, NOTHING);
const due =
  (turn: 'do' | 'accept' | 'reject' | 'waive'): Probe =>
  ({ ctx, actor, dueOf }) =>
    turnDue(ctx, actor, { id: dueOf(turn), turn }, NOTHING);

/** By the act of the table. */
export const PROBES: Readonly<Record<string, Probe>> = {
  ...Object.fromEntries(STAGE_ACTS.map((act) => [act, stage(act)])),
  read: ({ ctx, actor, number }) => openCase(ctx, actor, number),
  calculate: ({ actor }) => workCases({ id: actor.person.id, roles: actor.roles }, { cases: [] }),
  raise: ({ ctx, actor }) => raiseCase(ctx, actor, NOTHING),
  copy: ({ ctx, actor, number }) => copyCase(ctx, actor, number, NOTHING),
  'edit-brief': ({ ctx, actor, number }) => editBrief(ctx, actor, number, NOTHING),
  nominate: ({ ctx, actor, number }) => nominate(ctx, actor, number, NOTHING),
  'answer-affected': ({ ctx, actor, number }) => answerAffected(ctx, actor, number, NOTHING),
  'edit-document': ({ ctx, actor, number }) => editDocument(ctx, actor, { number, system: 'none' }, NOTHING),
  unseen: ({ ctx, actor, number }) => enterUnseen(ctx, actor, number, NOTHING),
  reveal: ({ ctx, actor, number }) => revealUnseen(ctx, actor, number, NOTHING),
  reconcile: ({ ctx, actor, number }) => reconcileUnseen(ctx, actor, number, 'none', NOTHING),
  agree: ({ ctx, actor, number }) =>
    agreeSheet(ctx, actor, { number, document: 'none', sheet: 'none' }, NOTHING),
  'undo-agreement': ({ ctx, actor, number }) =>
    undoAgreement(ctx, actor, { number, document: 'none', sheet: 'none' }, NOTHING),
  'raise-finding': ({ ctx, actor, number }) => raiseFinding(ctx, actor, number, NOTHING),
  'answer-finding': finding('answer-finding'),
  'close-finding': finding('close-finding'),
  'reopen-finding': finding('reopen-finding'),
  require: ({ ctx, actor, number }) =>
    askDue(ctx, actor, {
      once: NOTHING.once,
      body: {
        ok: true,
        value: { case: number, kind: 'start-up', text: 'Close the drain.', due: '2030-01-01' },
      },
    }),
  'enter-field': ({ ctx, actor, number }) => enterField(ctx, actor, number, NOTHING),
  fix: ({ ctx, actor, number }) => fixDiscrepancy(ctx, actor, { number, discrepancy: 1 }, NOTHING),
  'see-again': ({ ctx, actor, number }) => seeAgain(ctx, actor, { number, discrepancy: 1 }, NOTHING),
  'send-back': ({ ctx, actor, number }) => sendBack(ctx, actor, { number, discrepancy: 1 }, NOTHING),
  'do-due': due('do'),
  'accept-due': due('accept'),
  'reject-due': due('reject'),
  'waive-due': due('waive'),
  administer: ({ ctx, actor }) => addPerson(ctx, actor, NOTHING),
  upload: ({ ctx, actor, number }) =>
    keepPhotograph(ctx, actor, { number, folder: '' }, { name: 'x', bytes: Uint8Array.of(1) }),
};
