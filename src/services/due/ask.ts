/* Makes due items: an own note, or what an approver asks for while a case waits for approval. */
import { can, type DueKind } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { findCaseByNumber } from '@data/cases';
import { type CaseRow } from '@data/tables/cases';
import { addDue } from '@data/due';
import { newId } from '@data/ids';
import { peopleOfSite } from '@data/people';
import { appendTrail } from '@data/trail';
import { loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { answeredBefore, inOneAct, type Write } from '../one-act';
import { type AskBody } from './bodies';

export type AskedAnswer = { id: string; version: number };

const REQUIRED: readonly DueKind[] = ['approval-requirement', 'start-up', 'pssr', 'training'];

/** Whether the actor may ask for this: approvers while their case waits for approval, everyone for themselves. */
async function permitted(ctx: Ctx, actor: Actor, number: string | undefined): Promise<Result<null>> {
  if (number === undefined) {
    const may = can(whoOf(actor), 'do-due', { seats: [], owner: actor.person.id });
    return may.ok ? ok(null) : fail(may.code, may.sentence);
  }
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = can(whoOf(actor), 'require', onFile(file));
  return may.ok ? ok(null) : fail(may.code, may.sentence);
}

function wrong(path: string, sentence: string): Result<never> {
  return fail('SCHEMA', sentence, { errors: [{ path, code: 'wrong', sentence }] });
}

async function fits(ctx: Ctx, actor: Actor, body: AskBody, owner: string): Promise<Result<null>> {
  if (body.case === undefined)
    return body.kind === 'own-note' && owner === actor.person.id
      ? ok(null)
      : wrong('kind', 'Without a case a due item is a note to oneself.');
  if (!REQUIRED.includes(body.kind))
    return wrong('kind', `An approver asks for one of ${REQUIRED.join(', ')}.`);
  const people = await peopleOfSite(ctx.db, actor.site.id);
  return people.some((one) => one.id === owner && !one.retiredAt)
    ? ok(null)
    : wrong('owner', 'The owner is not a person of this site.');
}

/** Makes a due item. Requirements of approval fall before the signature; with it, they go in the act SIGN itself. */
export async function askDue(
  ctx: Ctx,
  actor: Actor,
  sent: Pick<Write<AskBody>, 'body' | 'once'>,
): Promise<Result<AskedAnswer>> {
  const before = sent.once.ok ? await answeredBefore<AskedAnswer>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const number = sent.body.ok ? sent.body.value.case : undefined;
  const may = await permitted(ctx, actor, number);
  if (!may.ok) return may;
  if (!sent.body.ok) return sent.body;
  if (!sent.once.ok) return sent.once;
  const body = sent.body.value;
  const owner = body.owner ?? actor.person.id;
  const fit = await fits(ctx, actor, body, owner);
  if (!fit.ok) return fit;
  const of = number === undefined ? undefined : await findCaseByNumber(ctx.db, actor.site.id, number);
  return write(ctx, actor, sent.once.value, { body, owner, of });
}

type Made = { body: AskBody; owner: string; of: CaseRow | undefined };

function write(
  ctx: Ctx,
  actor: Actor,
  key: Parameters<typeof inOneAct>[2],
  { body, owner, of }: Made,
): Promise<Result<AskedAnswer>> {
  return inOneAct(ctx, actor, key, async (trx) => {
    const at = instant(ctx);
    const id = newId('due');
    await addDue(trx, {
      id,
      siteId: actor.site.id,
      kind: body.kind,
      caseId: of?.id ?? null,
      documentId: body.document ?? null,
      subject: body.subject ?? null,
      text: body.text,
      ownerId: owner,
      due: body.due,
      closes: body.bars === 'start-up' ? 'field' : null,
      bars: body.bars ?? null,
      state: 'open',
      interim: body.interim ?? null,
      outcome: body.outcome ?? null,
      askedBy: actor.person.id,
      askedAt: at,
    });
    await appendTrail(trx, {
      siteId: actor.site.id,
      at,
      act: 'due.asked',
      byId: actor.person.id,
      ...(of ? { caseId: of.id } : {}),
      subject: `due/${id}`,
      body: {
        changes: [
          { path: 'text', new: body.text },
          { path: 'due', new: body.due },
        ],
      },
      hides: false,
    });
    return ok({ id, version: 1 });
  });
}
