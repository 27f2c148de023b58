/* One act of the stage table, whole: permission, version, gate, machine, and all that is written with it in one transaction. */
import { type Can, can, type Gate, gateOf, type On, openPoints, type Stage, STAGE_WORDS } from '@domain/case';
import { fail, type OpenPoint, ok, type Result } from '@domain/result';
import { caseSnapshot, nextCase, type CaseContext, type CaseEvent } from '@workflows/case';
import { type Auth, confirmPassword } from '@auth/index';
import { updateCase } from '@data/cases';
import { appendTrail } from '@data/trail';
import { type CaseFile, loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, today, whoOf } from '../context';
import { gateFacts } from '../gate-facts';
import { isHiddenFrom } from '../hidden-view';
import { answeredBefore, inOneAct, type Once, stale, type Write } from '../one-act';
import { EFFECTS } from './effects';
import { eventOf, withProposed } from './event';
import { tellSeats } from './notices';
import { documentOf } from './revisions';
import { pageHash } from './sign';
import { type StageAct, type StageBody, type StageWrite } from './types';

/** Acts that are signatures: they ask for the password again and for what was in view. */
export const SIGNING: readonly StageAct[] = [
  'PASS-draft',
  'PASS-draft-graded',
  'PASS-scenarios',
  'PASS-check',
  'SIGN',
  'ISSUE',
];

export type StageRequest = {
  number: string;
  act: StageAct;
  body: StageBody;
  version: number;
  once: Once;
  /** Address of the asker, for the count of wrong passwords. */
  ip: string;
};
/** A request as it was sent. */
export type SentStageRequest = Pick<StageRequest, 'number' | 'act' | 'ip'> & Write<StageBody>;
export type StageAnswer = { number: string; stage: Stage; version: number };

/** The machine's context, always taken from the rows. */
export function contextOf(file: CaseFile): CaseContext {
  const { row } = file;
  return {
    class: row.class,
    graded: row.class === 'first-issue' && file.documents.every((one) => one.document.grade !== 'worked'),
    acted: row.actedAt !== null,
    ...(row.endsOn !== null ? { ends: row.endsOn } : {}),
    extensions: row.extensions.length,
    ...(row.heldFrom ? { heldFrom: row.heldFrom } : {}),
    documents: file.documents.map((one) => ({ id: one.document.id, state: one.row.state })),
    removed: [],
  };
}

/** Facts of the single act that its row of the table asks for. */
function onAct(file: CaseFile, act: StageAct): On {
  const on = onFile(file);
  const installers = file.entries.flatMap((entry) => [
    ...(entry.asWhat === 'installer' ? [entry.byId] : []),
    ...(entry.installer ? [entry.installer] : []),
  ]);
  const authors = file.documents.flatMap((one) =>
    (one.after?.body.externalSheets ?? []).flatMap((sheet) => sheet.person ?? []),
  );
  const unseenStands = file.unseen.length > 0 && file.row.stage === 'check';
  return { ...on, authors, ...(act === 'ISSUE' ? { installers } : {}), unseenStands };
}

/** Whether the actor may do the act on the case now, by the table alone. */
export function mayAct(file: CaseFile, actor: Actor, act: StageAct): Can {
  return can(whoOf(actor), act, onAct(file, act));
}

function notOpen(points: readonly OpenPoint[]): Result<never> {
  const count = points.length === 1 ? 'One point is' : `${String(points.length)} points are`;
  return fail('GATE_SHUT', `${count} still open at this gate.`, { openPoints: [...points] });
}

async function passwordAndPage(
  auth: Auth,
  actor: Actor,
  request: StageRequest,
  page: string,
): Promise<Result<null>> {
  if (!SIGNING.includes(request.act)) return ok(null);
  const password = request.body.password ?? '';
  if (password === '') {
    return fail('SCHEMA', 'password: type your password: this act is a signature.', {
      errors: [
        { path: 'password', code: 'missing', sentence: 'Type your password: this act is a signature.' },
      ],
    });
  }
  const confirmed = await confirmPassword(auth, actor.person.id, password, request.ip);
  if (!confirmed.ok) return confirmed;
  if (request.body.pageHash === page) return ok(null);
  return fail('STALE', 'What you sign has changed since the page was shown. Read it again, then sign.', {
    present: { page },
  });
}

type Ready = { event: CaseEvent; write: Omit<StageWrite, 'trx' | 'reached'>; points: OpenPoint[] };

async function prepare(ctx: Ctx, actor: Actor, file: CaseFile, request: StageRequest): Promise<Ready> {
  const { act, body } = request;
  const day = today(ctx, file.site);
  const seen = await gateFacts(ctx.db, file, day, false);
  const facts = withProposed({ ...seen, hidden: isHiddenFrom(seen, actor) }, file, actor, body);
  const gate: Gate | undefined = SIGNING.includes(act) ? gateOf(file.row.stage) : undefined;
  const points = gate
    ? openPoints(gate, facts, act === 'ISSUE' ? documentOf(file, body.document)?.document.id : undefined)
    : [];
  const event = await eventOf(ctx, file, actor, facts, request, points);
  return { event, points, write: { ctx, actor, file, facts, act, body, at: instant(ctx), today: day } };
}

async function writeStep(
  ready: Ready,
  file: CaseFile,
  request: StageRequest,
  trx: StageWrite['trx'],
): Promise<Result<StageAnswer>> {
  const step = nextCase(caseSnapshot(file.row.stage, contextOf(file)), ready.event);
  if (!step.can)
    return fail(
      'WRONG_STAGE',
      `The case stands in ${STAGE_WORDS[file.row.stage]}; this act leads nowhere from there.`,
    );
  const reached = step.snapshot.value as Stage;
  const write: StageWrite = { ...ready.write, trx, reached };
  for (const effect of step.effects) await EFFECTS[effect]?.(write);
  const heldFrom = step.snapshot.context.heldFrom ?? null;
  const moved = reached !== file.row.stage;
  const patch = {
    stage: reached,
    heldFrom,
    snapshot: step.snapshot.toJSON(),
    ...(moved ? { stageAt: write.at } : {}),
    ...(request.act === 'PASS-draft' ? { rulesId: file.rulesRow.id } : {}),
    ...(['withdrawn', 'refused'].includes(reached) ? { closedAt: write.at } : {}),
  };
  if (!(await updateCase(trx, file.row.id, request.version, patch)))
    return stale(`Case ${file.row.number}`, file.row.version);
  await appendTrail(trx, {
    siteId: file.site.id,
    at: write.at,
    act: TRAIL_NAMES[request.act],
    byId: write.actor.person.id,
    caseId: file.row.id,
    subject: `cases/${file.row.number}`,
    body: {
      changes: [{ path: 'stage', old: file.row.stage, new: reached }],
      ...(request.body.reason !== undefined ? { why: request.body.reason } : {}),
    },
    hides: false,
  });
  await tellSeats(write);
  return ok({ number: file.row.number, stage: reached, version: request.version + 1 });
}

const TRAIL_NAMES: Record<StageAct, string> = {
  'PASS-draft': 'gate.passed',
  'PASS-draft-graded': 'gate.passed',
  'PASS-scenarios': 'gate.passed',
  'PASS-check': 'gate.passed',
  SIGN: 'approval.signed',
  REFUSE: 'case.refused',
  'RETURN-own': 'case.returned',
  'RETURN-check': 'case.returned',
  'RETURN-approval': 'case.returned',
  'RETURN-field': 'case.returned',
  HOLD: 'case.held',
  RESUME: 'case.resumed',
  WITHDRAW: 'case.withdrawn',
  ISSUE: 'revision.issued',
  DROP: 'revision.dropped',
  CARRY_OVER: 'case.carried-over',
};

/** The request once its body, version and key are known to be whole. */
function whole(sent: SentStageRequest): Result<StageRequest> {
  const { body, version, once } = sent;
  if (!body.ok) return body;
  if (!version.ok) return version;
  if (!once.ok) return once;
  return ok({
    number: sent.number,
    act: sent.act,
    ip: sent.ip,
    body: body.value,
    version: version.value,
    once: once.value,
  });
}

const SIGNED_ALREADY =
  'You have signed the approval as it stands. It waits for the other approvers; your signature falls when something signed is changed.';

/** True when the approval carries the actor's valid signature already: one person signs once. */
function hasSigned({ signatures }: StageWrite['facts'], actor: Actor): boolean {
  return signatures.some((one) => one.gate === 'approval' && one.valid && one.person === actor.person.id);
}

/**
 * Does one act of the stage table. Refusals in the order of the model: unknown case, permission, independence, stage,
 * what was sent, version, gate, password and page. Nothing is written unless all of it is.
 */
export async function stageAct(
  ctx: Ctx,
  auth: Auth,
  actor: Actor,
  sent: SentStageRequest,
): Promise<Result<StageAnswer>> {
  const before = sent.once.ok ? await answeredBefore<StageAnswer>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const file = await loadCaseFile(ctx.db, actor.site, sent.number);
  if (!file) return fail('UNKNOWN', `This site has no case ${sent.number}.`);
  const may = mayAct(file, actor, sent.act);
  if (!may.ok) return fail(may.code, may.sentence);
  const request = whole(sent);
  if (!request.ok) return request;
  if (file.row.version !== request.value.version) return stale(`Case ${file.row.number}`, file.row.version);
  const ready = await prepare(ctx, actor, file, request.value);
  if (sent.act === 'SIGN' && hasSigned(ready.write.facts, actor)) return fail('WRONG_STAGE', SIGNED_ALREADY);
  if (ready.points.length > 0) return notOpen(ready.points);
  const signed = await passwordAndPage(
    auth,
    actor,
    request.value,
    pageHash(file, sent.act, request.value.body.document),
  );
  if (!signed.ok) return signed;
  return inOneAct(ctx, actor, request.value.once, (trx) => writeStep(ready, file, request.value, trx));
}
