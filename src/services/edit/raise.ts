/* Raises a case on one or more systems, or copies a refused or withdrawn one to a new draft. */
import { type ActBody, can, emptyBrief, briefHash, type Brief } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { cleanRich } from '@domain/text';
import { caseSnapshot } from '@workflows/case';
import { createCase, nextCaseNumber, putCaseDocument, takeSeat } from '@data/cases';
import { type Db } from '@data/connection';
import { type DocumentRow, findDocument, findDocumentByTag } from '@data/documents';
import { newId } from '@data/ids';
import { appendTrail } from '@data/trail';
import { writeSearch } from '@data/search';
import { loadCaseFile, onFile, rulesOf } from '../case-file';
import { type Actor, type Ctx, instant, today, whoOf } from '../context';
import { answeredBefore, inOneAct, type Write } from '../one-act';
import { noteAffected } from './affected';
import { isRaisable, RAISABLE_SENTENCE } from './classes';

export type Raised = { number: string; version: number };

async function systemsNamed(
  db: Db,
  siteId: string,
  names: readonly string[],
): Promise<Result<DocumentRow[]>> {
  const found: DocumentRow[] = [];
  for (const name of new Set(names)) {
    const document = (await findDocumentByTag(db, siteId, 'system', name)) ?? (await findDocument(db, name));
    if (document?.kind !== 'system' || document.siteId !== siteId || document.retiredAt !== null) {
      return fail('SCHEMA', `systems: this site has no system ${name.slice(0, 60)}.`, {
        errors: [
          { path: 'systems', code: 'unknown', sentence: `This site has no system ${name.slice(0, 60)}.` },
        ],
      });
    }
    found.push(document);
  }
  return ok(found);
}

type New = {
  class: ActBody<'raise'>['class'];
  brief: Brief;
  systems: readonly DocumentRow[];
  copiedFrom?: string;
};

async function write(trx: Db, ctx: Ctx, actor: Actor, made: New): Promise<Result<Raised>> {
  const at = instant(ctx);
  const { site, person } = actor;
  const { row: rulesRow } = await rulesOf(trx, site.id);
  const letters =
    typeof site.facts['caseLetters'] === 'string'
      ? site.facts['caseLetters']
      : site.slug.slice(0, 2).toUpperCase();
  const number = await nextCaseNumber(trx, site.id, letters, Number(today(ctx, site).slice(0, 4)));
  const id = newId('case');
  const { brief } = made;
  const context = {
    class: made.class,
    graded: made.class === 'first-issue' && made.systems.every((one) => one.grade !== 'worked'),
    acted: false,
    ...(brief.ends !== undefined ? { ends: brief.ends } : {}),
    extensions: 0,
    documents: made.systems.map((one) => ({ id: one.id, state: 'open' as const })),
    removed: [],
  };
  await createCase(trx, {
    id,
    siteId: site.id,
    number,
    title: brief.title,
    class: made.class,
    stage: 'draft',
    snapshot: caseSnapshot('draft', context).toJSON(),
    brief,
    briefHash: briefHash(brief),
    startsOn: brief.starts ?? null,
    endsOn: brief.ends ?? null,
    raisedBy: person.id,
    raisedAt: at,
    stageAt: at,
    copiedFrom: made.copiedFrom ?? null,
    rulesId: rulesRow.id,
  });
  await takeSeat(trx, { caseId: id, role: 'originator', personId: person.id, fromAt: at });
  for (const one of made.systems) {
    await putCaseDocument(trx, {
      caseId: id,
      documentId: one.id,
      why: 'own',
      baseId: one.inForceId,
      workingId: null,
      state: 'open',
      actedAt: null,
    });
  }
  await noteAffected(trx, site.id, id, made.systems);
  await writeSearch(trx, id, [
    {
      kind: 'case',
      siteId: site.id,
      place: `cases/${number}`,
      hides: false,
      title: `${number} ${brief.title}`,
      body: made.systems.map((one) => one.tag).join(' '),
    },
  ]);
  await appendTrail(trx, {
    siteId: site.id,
    at,
    act: 'case.raised',
    byId: person.id,
    seat: 'originator',
    caseId: id,
    subject: `cases/${number}`,
    body: {
      changes: [
        { path: 'systems', new: made.systems.map((one) => one.tag) },
        { path: 'class', new: made.class },
      ],
    },
    hides: false,
  });
  return ok({ number, version: 1 });
}

function notRaisable(): Result<never> {
  const errors = [{ path: 'class', code: 'class', sentence: RAISABLE_SENTENCE }];
  return fail('SCHEMA', RAISABLE_SENTENCE, { errors });
}

/** Raises a case. SCHEMA when a system is unknown; the first answer again when the key was sent before. */
export async function raiseCase(
  ctx: Ctx,
  actor: Actor,
  sent: Omit<Write<ActBody<'raise'>>, 'version'>,
): Promise<Result<Raised>> {
  const may = can(whoOf(actor), 'raise', { seats: [] });
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.once.ok) return sent.once;
  if (!isRaisable(sent.body.value.class)) return notRaisable();
  const systems = await systemsNamed(ctx.db, actor.site.id, sent.body.value.systems);
  if (!systems.ok) return systems;
  const { class: kind, title, ends, whatChanges } = sent.body.value;
  const brief = {
    ...emptyBrief(title),
    ...(ends !== undefined ? { ends } : {}),
    ...(whatChanges ? { whatChanges: cleanRich(whatChanges) } : {}),
  };
  return inOneAct(ctx, actor, sent.once.value, (trx) =>
    write(trx, ctx, actor, { class: kind, brief, systems: systems.value }),
  );
}

/** Copies a refused or withdrawn case to a new draft of its originator. */
export async function copyCase(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Pick<Write<unknown>, 'once' | 'body'>,
): Promise<Result<Raised>> {
  const before = sent.once.ok ? await answeredBefore<Raised>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = can(whoOf(actor), 'copy', onFile(file));
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.once.ok) return sent.once;
  const made = {
    class: file.row.class,
    brief: file.row.brief,
    systems: file.documents.map((one) => one.document),
    copiedFrom: file.row.id,
  };
  return inOneAct(ctx, actor, sent.once.value, (trx) => write(trx, ctx, actor, made));
}
