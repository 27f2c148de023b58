/* Discrepancies of a field sheet: put right, seen again, or sent back to the case. */
import { type ActBody, type SeatRole } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { richFromText } from '@domain/text';
import { type DiscrepancyEvent, nextDiscrepancy } from '@workflows/discrepancy';
import { type Db } from '@data/connection';
import { type DiscrepancyRow, updateDiscrepancy } from '@data/field';
import { raiseFinding } from '@data/findings';
import { newId } from '@data/ids';
import { type CaseFile } from '../case-file';
import { type Actor, type Ctx, instant } from '../context';
import { notify } from '../notify';
import { type EntryBody } from './bodies';
import { lineOfEntry, readyEntry, writeEntry } from './entry';
import { type FieldSent, fieldWrite, installersOfLine, type Written } from './field-write';

export type At = { number: string; discrepancy: number };
export type DiscrepancyAnswer = {
  number: string;
  version: number;
  discrepancy: number;
  state: DiscrepancyRow['state'];
};
type Own = Pick<DiscrepancyAnswer, 'discrepancy' | 'state'>;

const STATES: Record<DiscrepancyRow['state'], string> = {
  open: 'open: say first what was put right',
  fixed: 'put right and waits to be seen again',
  'seen-again': 'settled: it was seen again',
  'sent-back': 'sent back to the case',
  accepted: 'accepted',
};

function found(file: CaseFile, at: At): Result<DiscrepancyRow> {
  const row = file.discrepancies.find((one) => one.number === at.discrepancy);
  return row ? ok(row) : fail('UNKNOWN', `This field sheet has no discrepancy ${String(at.discrepancy)}.`);
}

/** Installers of the line that a discrepancy is about: none of them puts right or sees again what they installed. */
function factsOf(at: At) {
  return (file: CaseFile) => {
    const row = file.discrepancies.find((one) => one.number === at.discrepancy);
    const line = file.entries.find((entry) => entry.id === row?.entryId)?.line ?? '';
    return { installers: installersOfLine(file, line) };
  };
}

type Turn = { event: DiscrepancyEvent['type']; text: string; findingId?: string };

async function turn(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  row: DiscrepancyRow,
  { event, text, findingId }: Turn,
): Promise<Result<DiscrepancyRow['state']>> {
  const next = nextDiscrepancy(row.state, event);
  if (!next.can) return fail('WRONG_STAGE', `Discrepancy ${String(row.number)} is ${STATES[row.state]}.`);
  const patch = {
    state: next.state,
    posts: [...row.posts, { by: actor.person.id, at: instant(ctx), text }],
    ...(findingId === undefined ? {} : { findingId }),
  };
  if (!(await updateDiscrepancy(trx, row.id, row.version, patch)))
    return fail('STALE', `Discrepancy ${String(row.number)} was changed meanwhile.`);
  return ok(next.state);
}

function written(
  row: DiscrepancyRow,
  act: string,
  state: DiscrepancyRow['state'],
  why?: string,
): Written<Own> {
  const changes = [{ path: `discrepancies/${String(row.number)}`, old: row.state, new: state }];
  const seat: SeatRole = 'operations';
  return {
    tell: { act, seat, changes, hides: true, ...(why === undefined ? {} : { why }) },
    answer: { discrepancy: row.number, state },
  };
}

/** Says what was put right; the line must then be seen again. */
export function fixDiscrepancy(
  ctx: Ctx,
  actor: Actor,
  at: At,
  sent: FieldSent<ActBody<'fix'>>,
): Promise<Result<DiscrepancyAnswer>> {
  const asked = { number: at.number, act: 'fix' as const, sent, facts: factsOf(at) };
  return fieldWrite(ctx, actor, asked, async (trx, { file, body }) => {
    const row = found(file, at);
    if (!row.ok) return row;
    const state = await turn(trx, ctx, actor, row.value, { event: 'FIX', text: body.text });
    return state.ok ? ok(written(row.value, 'discrepancy.fixed', state.value, body.text)) : state;
  });
}

/** Sees the line again: as signed settles the discrepancy, anything else opens it anew. */
export function seeAgain(
  ctx: Ctx,
  actor: Actor,
  at: At,
  sent: FieldSent<{ entry: EntryBody }>,
): Promise<Result<DiscrepancyAnswer>> {
  const asked = { number: at.number, act: 'see-again' as const, sent, facts: factsOf(at) };
  return fieldWrite(ctx, actor, asked, async (trx, { file, body }) => {
    const row = found(file, at);
    if (!row.ok) return row;
    if (row.value.state !== 'fixed')
      return fail('WRONG_STAGE', `Discrepancy ${String(row.value.number)} is ${STATES[row.value.state]}.`);
    const line = lineOfEntry(file, row.value.entryId)?.key ?? body.entry.line;
    const again = { ...body.entry, line, as: 'verifier' as const };
    const { ready, faults } = await readyEntry(trx, ctx, actor, file, again, 'entry');
    if (!ready || faults.length > 0)
      return fail('SCHEMA', faults[0]?.sentence ?? 'The entry does not fit.', { errors: faults });
    if (file.entries.some((one) => one.clientId === ready.client))
      return fail('KEY_REUSED', 'This entry was sent before. Look at the line once more and send it anew.');
    await writeEntry(trx, ready);
    const agrees = ready.compared?.agrees === true;
    const text = ready.compared?.sentence ?? 'It could not be read when it was seen again.';
    const state = await turn(trx, ctx, actor, row.value, { event: agrees ? 'SEE_AGAIN' : 'REOPEN', text });
    return state.ok ? ok(written(row.value, 'discrepancy.seen-again', state.value)) : state;
  });
}

async function findingFor(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  file: CaseFile,
  row: DiscrepancyRow,
  text: string,
): Promise<string> {
  const line = lineOfEntry(file, row.entryId);
  const id = newId('finding');
  const at = instant(ctx);
  const said = richFromText(`Discrepancy ${String(row.number)}, ${line?.label ?? 'field sheet'}: ${text}`);
  const finding = await raiseFinding(
    trx,
    {
      id,
      caseId: file.row.id,
      weight: 'must-fix',
      place: line?.key ?? 'field',
      state: 'open',
      raisedBy: actor.person.id,
      raisedAt: at,
      successorId: null,
    },
    { byId: actor.person.id, at, text: said, changePath: null },
  );
  await notify(trx, ctx, actor, file, { event: 'case.finding-raised', finding, mustFix: true });
  return id;
}

/** Sends it back: the plant stays as it is and the case must change. Raises a must-fix finding for the originator. */
export function sendBack(
  ctx: Ctx,
  actor: Actor,
  at: At,
  sent: FieldSent<ActBody<'send-back'>>,
): Promise<Result<DiscrepancyAnswer>> {
  return fieldWrite(
    ctx,
    actor,
    { number: at.number, act: 'send-back', sent },
    async (trx, { file, body }) => {
      const row = found(file, at);
      if (!row.ok) return row;
      if (row.value.state !== 'open')
        return fail('WRONG_STAGE', `Discrepancy ${String(row.value.number)} is ${STATES[row.value.state]}.`);
      const findingId = await findingFor(trx, ctx, actor, file, row.value, body.text);
      const state = await turn(trx, ctx, actor, row.value, {
        event: 'SEND_BACK',
        text: body.text,
        findingId,
      });
      return state.ok ? ok(written(row.value, 'discrepancy.sent-back', state.value, body.text)) : state;
    },
  );
}
