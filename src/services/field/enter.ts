/* Enters what operations see: every line compared with what was signed, and the signed value shown only after it. */
import { can } from '@domain/case';
import { type Q } from '@engine/quantity';
import { fail, ok, type Result } from '@domain/result';
import { canonical } from '@domain/basis';
import { type Db } from '@data/connection';
import { type FieldEntryRow } from '@data/field';
import { type CaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, whoOf } from '../context';
import { type EntriesBody, type EntryBody } from './bodies';
import { type Fault, makeDiscrepancy, type Ready, readyEntry, unsettledOn, writeEntry } from './entry';
import { type FieldSent, fieldWrite, installersOfLine } from './field-write';

/** What became of one entry. `wants` is what was signed: it is given because the line has now been seen. */
export type EntryAnswer = {
  client: string;
  line: string;
  state: 'accepted' | 'conflict';
  agrees?: boolean;
  wants?: Q | string;
  sentence: string;
  discrepancy?: number;
};
export type EnteredAnswer = { number: string; version: number; entries: EntryAnswer[] };

function notIndependent(file: CaseFile, actor: Actor, body: EntryBody): string | undefined {
  if (body.as !== 'verifier') return undefined;
  const installers = installersOfLine(file, body.line, body.installer === undefined ? [] : [body.installer]);
  const may = can(whoOf(actor), 'enter-field', { ...onFile(file), installers });
  return may.ok ? undefined : may.sentence;
}

/** The answer to an entry that needs no writing: sent before, or on a line whose discrepancy is still being settled. */
function standing(
  file: CaseFile,
  known: ReadonlyMap<string, FieldEntryRow>,
  ready: Ready,
): EntryAnswer | undefined {
  const { line, client, entry } = ready;
  const before = known.get(client);
  const base = { client, line: line.key };
  if (before) {
    const same =
      before.line === line.key &&
      canonical(before.seen) === canonical(entry.seen ?? null) &&
      before.byId === entry.by;
    return same
      ? { ...base, state: 'accepted', ...shown(ready), sentence: 'Received before.' }
      : { ...base, state: 'conflict', sentence: 'Another entry was sent under this id before; it stands.' };
  }
  const open = entry.as === 'verifier' ? unsettledOn(file, line.key) : undefined;
  if (!open) return undefined;
  const sentence = `Discrepancy ${String(open.number)} is not settled on this line: say what was put right, then see it again.`;
  return { ...base, state: 'conflict', sentence };
}

function shown({ line, compared }: Ready): Pick<EntryAnswer, 'agrees' | 'wants'> {
  return {
    ...(compared ? { agrees: compared.agrees } : {}),
    ...(line.wants === undefined ? {} : { wants: line.wants }),
  };
}

async function enterOne(trx: Db, ctx: Ctx, actor: Actor, file: CaseFile, ready: Ready): Promise<EntryAnswer> {
  const already = standing(file, new Map(file.entries.map((one) => [one.clientId, one])), ready);
  if (already) return already;
  await writeEntry(trx, ready);
  const discrepancy = await makeDiscrepancy(trx, ctx, actor, file, ready);
  return {
    client: ready.client,
    line: ready.line.key,
    state: 'accepted',
    ...shown(ready),
    sentence: ready.compared?.sentence ?? 'Recorded as not readable, by a second means and a second person.',
    ...(discrepancy === undefined ? {} : { discrepancy }),
  };
}

async function readyAll(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  file: CaseFile,
  entries: readonly EntryBody[],
): Promise<Result<Ready[]>> {
  const all: Ready[] = [];
  const faults: Fault[] = [];
  for (const [index, body] of entries.entries()) {
    const path = `entries/${String(index)}`;
    const denied = notIndependent(file, actor, body);
    if (denied !== undefined)
      return fail('NOT_INDEPENDENT', denied, {
        errors: [{ path, code: 'not-independent', sentence: denied }],
      });
    const found = await readyEntry(trx, ctx, actor, file, body, path);
    faults.push(...found.faults);
    if (found.ready) all.push(found.ready);
  }
  if (faults.length > 0)
    return fail('SCHEMA', faults[0]?.sentence ?? 'An entry does not fit.', { errors: faults });
  return ok(all);
}

/**
 * Enters lines of a field sheet; a client id sent again is stored once. The verifier's entry that differs makes a
 * discrepancy, told once. NOT_INDEPENDENT for a verifier who installed the line or sits as originator or checker.
 */
export function enterField(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: FieldSent<EntriesBody>,
): Promise<Result<EnteredAnswer>> {
  return fieldWrite(
    ctx,
    actor,
    { number, act: 'enter-field', sent, facts: () => ({ installers: [] }) },
    async (trx, of) => {
      const ready = await readyAll(trx, ctx, actor, of.file, of.body.entries);
      if (!ready.ok) return ready;
      const entries: EntryAnswer[] = [];
      for (const one of ready.value) entries.push(await enterOne(trx, ctx, actor, of.file, one));
      const changes = entries
        .filter((one) => one.state === 'accepted')
        .map((one) => ({ path: one.line, new: one.agrees === false ? 'differs' : 'seen' }));
      return ok({
        tell: { act: 'field.entered', seat: 'operations', changes, hides: true },
        answer: { entries },
      });
    },
  );
}
