/* What every write on a field sheet shares: permission first, then what was sent; always on the case as it stands in the transaction. */
import { type Act, can, type Id, type On } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { findCase } from '@data/cases';
import { type Db } from '@data/connection';
import { type CaseFile, loadCaseFile, onFile } from '../case-file';
import { type Told, told } from '../check/case-write';
import { type Actor, type Ctx, whoOf } from '../context';
import { answeredBefore, inOneAct, stale, type Write } from '../one-act';

/** Field writes add to the record and carry keys of their own, so that no version is asked for. */
export type FieldSent<B> = Pick<Write<B>, 'body' | 'once'>;
type Asked<B> = { number: string; act: Act; sent: FieldSent<B>; facts?: (file: CaseFile) => Partial<On> };
export type Written<T> = { tell: Told; answer: T };

/** Who installed what a line is about, by what was entered before; `also` is told by the entry that is judged. */
export function installersOfLine(file: CaseFile, line: string, also: readonly Id[] = []): Id[] {
  const entered = file.entries
    .filter((entry) => entry.line === line)
    .flatMap((entry) => [
      ...(entry.asWhat === 'installer' ? [entry.byId] : []),
      ...(entry.installer ? [entry.installer] : []),
    ]);
  return [...entered, ...also];
}

function refusal<B>(file: CaseFile, actor: Actor, asked: Asked<B>): Result<null> {
  const may = can(whoOf(actor), asked.act, { ...onFile(file), ...asked.facts?.(file) });
  return may.ok ? ok(null) : fail(may.code, may.sentence);
}

async function inside<B, T extends object>(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  asked: Asked<B>,
  read: CaseFile,
  write: (trx: Db, file: CaseFile) => Promise<Result<Written<T>>>,
): Promise<Result<T & { number: string; version: number }>> {
  const row = await findCase(trx, read.row.id);
  const moved = row?.version !== read.row.version;
  const file = moved ? await loadCaseFile(trx, actor.site, asked.number) : read;
  if (!file) return fail('UNKNOWN', `This site has no case ${asked.number}.`);
  const may = moved ? refusal(file, actor, asked) : ok(null);
  if (!may.ok) return may;
  const written = await write(trx, file);
  if (!written.ok) return written;
  if (!(await told(trx, ctx, actor, file, written.value.tell)))
    return stale(`Case ${asked.number}`, file.row.version + 1);
  return ok({ ...written.value.answer, number: asked.number, version: file.row.version + 1 });
}

/** One write on the field sheet of a case, from the request to the answer. */
export async function fieldWrite<B, T extends object>(
  ctx: Ctx,
  actor: Actor,
  asked: Asked<B>,
  write: (trx: Db, of: { file: CaseFile; body: B }) => Promise<Result<Written<T>>>,
): Promise<Result<T & { number: string; version: number }>> {
  type Answer = T & { number: string; version: number };
  const { sent, number } = asked;
  const before = sent.once.ok ? await answeredBefore<Answer>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = refusal(file, actor, asked);
  if (!may.ok) return may;
  if (!sent.body.ok) return sent.body;
  if (!sent.once.ok) return sent.once;
  const body = sent.body.value;
  return inOneAct(ctx, actor, sent.once.value, (trx) =>
    inside(trx, ctx, actor, asked, file, (inner, present) => write(inner, { file: present, body })),
  );
}
