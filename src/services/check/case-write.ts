/* What every write below a case shares: the case, permission, what was sent, the version, and the trail. */
import { type Act, can, type On, type SeatRole } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { updateCase } from '@data/cases';
import { type Db } from '@data/connection';
import { appendTrail, type TrailBody } from '@data/trail';
import { type CaseFile, loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { answeredBefore, inOneAct, type Once, stale, type Write } from '../one-act';

/** A write that may be done and whose parts are whole. */
export type Allowed<B> = { file: CaseFile; body: B; version: number; once: Once };

type Asked<B> = { number: string; act: Act; sent: Write<B>; facts?: (file: CaseFile) => Partial<On> };

/** Reads the case and judges asker, body, key and version, in that order; or gives the first answer to a repeated request. */
export async function allowed<B, T>(
  ctx: Ctx,
  actor: Actor,
  asked: Asked<B>,
): Promise<{ again: Result<T> } | { now: Result<Allowed<B>> }> {
  const { number, act, sent } = asked;
  const before = sent.once.ok ? await answeredBefore<T>(ctx, actor, sent.once.value) : undefined;
  if (before) return { again: before };
  return {
    now: await judged(ctx, actor, { number, act, sent, ...(asked.facts ? { facts: asked.facts } : {}) }),
  };
}

async function judged<B>(
  ctx: Ctx,
  actor: Actor,
  { number, act, sent, facts }: Asked<B>,
): Promise<Result<Allowed<B>>> {
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = can(whoOf(actor), act, { ...onFile(file), ...facts?.(file) });
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.version.ok) return sent.version;
  if (!sent.once.ok) return sent.once;
  if (file.row.version !== sent.version.value) return stale(`Case ${number}`, file.row.version);
  return ok({ file, body: sent.body.value, version: sent.version.value, once: sent.once.value });
}

export type Told = {
  act: string;
  seat: SeatRole;
  changes: TrailBody['changes'];
  why?: string;
  hides?: boolean;
};

/** Counts the case's version up and writes the act into the trail; false when another write came first. */
export async function told(trx: Db, ctx: Ctx, actor: Actor, file: CaseFile, entry: Told): Promise<boolean> {
  if (!(await updateCase(trx, file.row.id, file.row.version, {}))) return false;
  await appendTrail(trx, {
    siteId: file.site.id,
    at: instant(ctx),
    act: entry.act,
    byId: actor.person.id,
    seat: entry.seat,
    caseId: file.row.id,
    subject: `cases/${file.row.number}`,
    body: { changes: entry.changes, ...(entry.why !== undefined ? { why: entry.why } : {}) },
    hides: entry.hides ?? false,
  });
  return true;
}

/** One write below a case, from the request to the answer; `write` returns what is told in the trail and the answer's own part. */
export async function caseWrite<B, T extends object>(
  ctx: Ctx,
  actor: Actor,
  asked: Asked<B>,
  write: (trx: Db, of: Allowed<B>) => Promise<Result<{ tell: Told; answer: T }>>,
): Promise<Result<T & { number: string; version: number }>> {
  const start = await allowed<B, T & { number: string; version: number }>(ctx, actor, asked);
  if ('again' in start) return start.again;
  if (!start.now.ok) return start.now;
  const of = start.now.value;
  return inOneAct(ctx, actor, of.once, async (trx) => {
    const written = await write(trx, of);
    if (!written.ok) return written;
    if (!(await told(trx, ctx, actor, of.file, written.value.tell)))
      return stale(`Case ${asked.number}`, of.version + 1);
    return ok({ ...written.value.answer, number: asked.number, version: of.version + 1 });
  });
}
