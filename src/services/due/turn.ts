/* Due items: done by their owner, accepted or rejected by who asked, waived by an approver. */
import { type Act, can, type On } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { findCase, seatsOf } from '@data/cases';
import { type Db } from '@data/connection';
import { type DueRow, findDue, moveDue } from '@data/due';
import { appendTrail } from '@data/trail';
import { nextDueItem, type DueItemEvent } from '@workflows/due-item';
import { domainSeats } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { answeredBefore, inOneAct, stale, type Write } from '../one-act';
import { type DueAct, type DueBody } from './bodies';

export type DueAnswer = { id: string; state: DueRow['state']; version: number };

const ACTS: Record<DueAct, { act: Act; event: DueItemEvent['type']; told: string }> = {
  do: { act: 'do-due', event: 'DO', told: 'due.done' },
  accept: { act: 'accept-due', event: 'ACCEPT', told: 'due.accepted' },
  reject: { act: 'reject-due', event: 'REJECT', told: 'due.rejected' },
  waive: { act: 'waive-due', event: 'WAIVE', told: 'due.waived' },
};

/** What `can` reads of a due item: its owner, who asked, and the seats of its case. */
export async function onDue(db: Db, item: DueRow): Promise<On> {
  const seats = item.caseId ? domainSeats(await seatsOf(db, item.caseId)) : [];
  const stage = item.caseId ? (await findCase(db, item.caseId))?.stage : undefined;
  return { seats, owner: item.ownerId, askedBy: item.askedBy, ...(stage ? { stage } : {}) };
}

async function write(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  item: DueRow,
  turn: DueAct,
  body: DueBody,
): Promise<Result<DueAnswer>> {
  const { event, told } = ACTS[turn];
  const next = nextDueItem(item.state, event);
  if (!next.can) return fail('WRONG_STAGE', `This due item is ${item.state}.`);
  const at = instant(ctx);
  const text = body.text ?? body.reason ?? null;
  const evidence =
    turn === 'do' ? { text: body.text ?? '', ...(body.file ? { file: body.file } : {}) } : undefined;
  const patch = { state: next.state, ...(evidence ? { evidence } : {}) };
  const happened = { at, byId: actor.person.id, event: turn, text };
  if (!(await moveDue(trx, item.id, item.version, patch, happened)))
    return stale('The due item', item.version + 1);
  await appendTrail(trx, {
    siteId: item.siteId,
    at,
    act: told,
    byId: actor.person.id,
    ...(item.caseId ? { caseId: item.caseId } : {}),
    subject: `due/${item.id}`,
    body: {
      changes: [{ path: 'state', old: item.state, new: next.state }],
      ...(text === null ? {} : { why: text }),
    },
    hides: false,
  });
  return ok({ id: item.id, state: next.state, version: item.version + 1 });
}

/** Turns a due item. WRONG_STAGE when it does not stand where the act begins; STALE at another version. */
export async function turnDue(
  ctx: Ctx,
  actor: Actor,
  at: { id: string; turn: DueAct },
  sent: Write<DueBody>,
): Promise<Result<DueAnswer>> {
  const before = sent.once.ok ? await answeredBefore<DueAnswer>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const item = await findDue(ctx.db, at.id);
  if (item?.siteId !== actor.site.id) return fail('UNKNOWN', 'This site has no such due item.');
  const may = can(whoOf(actor), ACTS[at.turn].act, await onDue(ctx.db, item));
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.version.ok) return sent.version;
  if (!sent.once.ok) return sent.once;
  if (item.version !== sent.version.value) return stale('The due item', item.version, { state: item.state });
  const body = sent.body.value;
  return inOneAct(ctx, actor, sent.once.value, (trx) => write(trx, ctx, actor, item, at.turn, body));
}
