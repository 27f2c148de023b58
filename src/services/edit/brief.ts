/* Changes the brief of a case: what changes and why, effect, time, papers. */
import { briefHash, briefSchema, can, type Brief } from '@domain/case';
import { fail, fieldErrors, ok, type Result } from '@domain/result';
import { cleanRich, everyNode, nodesOf, plainText, type Rich } from '@domain/text';
import { updateCase } from '@data/cases';
import { appendTrail } from '@data/trail';
import { type CaseFile, loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { inOneAct, stale, type Write } from '../one-act';

export type BriefSaved = { number: string; version: number; brief: Brief };

const RICH = ['whatChanges', 'technicalBasis', 'effect', 'removal', 'safeguards', 'substitute'] as const;

/** A live node (figure, place, person) says more than its words. */
function holdsLive(text: Rich): boolean {
  return [...everyNode(nodesOf(text))].some((node) => ['figure', 'place', 'person'].includes(node.type));
}

/** A bare text area shows live figures as words: sent back unchanged, they stay live. */
function keptLive(stored: Rich | undefined, sent: Rich): Rich {
  const same = stored !== undefined && plainText(stored) === plainText(sent);
  return same && holdsLive(stored) && !holdsLive(sent) ? stored : sent;
}

function merged(file: CaseFile, patch: Partial<Brief>): Result<Brief> {
  const next: Record<string, unknown> = { ...file.row.brief, ...patch };
  for (const name of RICH)
    if (next[name] !== undefined)
      next[name] = keptLive(file.row.brief[name] as Rich | undefined, cleanRich(next[name]));
  const parsed = briefSchema.safeParse(next);
  if (parsed.success) return ok(parsed.data);
  const errors = fieldErrors(parsed.error.issues);
  return fail('SCHEMA', errors[0]?.sentence ?? 'The brief does not fit.', { errors });
}

function changesBetween(old: Brief, next: Brief): { path: string; old?: unknown; new?: unknown }[] {
  const names = new Set([...Object.keys(old), ...Object.keys(next)]) as Set<keyof Brief>;
  return [...names]
    .filter((name) => JSON.stringify(old[name]) !== JSON.stringify(next[name]))
    .map((name) => ({ path: `brief/${name}`, old: old[name], new: next[name] }));
}

/** What stands now, whole for a program, and field by field in plain words for a form. */
function presentOf(brief: Brief): Record<string, unknown> {
  const { title, timeNeeded, whatChanges, technicalBasis, effect } = brief;
  const texts = Object.entries({ whatChanges, technicalBasis, effect });
  return {
    brief,
    title,
    timeNeeded,
    ...Object.fromEntries(texts.map(([name, text]) => [name, plainText(text)])),
  };
}

/** Saves fields of the brief at the version that was read. STALE carries the present brief, so that both sides can be shown. */
export async function editBrief(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Omit<Write<Partial<Brief>>, 'once'>,
): Promise<Result<BriefSaved>> {
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = can(whoOf(actor), 'edit-brief', onFile(file));
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.version.ok) return sent.version;
  if (file.row.version !== sent.version.value)
    return stale(`The brief of ${number}`, file.row.version, presentOf(file.row.brief));
  const next = merged(file, sent.body.value);
  if (!next.ok) return next;
  const brief = next.value;
  const patch = {
    brief,
    briefHash: briefHash(brief),
    title: brief.title,
    startsOn: brief.starts ?? null,
    endsOn: brief.ends ?? null,
  };
  return inOneAct(ctx, actor, undefined, async (trx) => {
    if (!(await updateCase(trx, file.row.id, file.row.version, patch)))
      return stale(`The brief of ${number}`, file.row.version + 1);
    await appendTrail(trx, {
      siteId: file.site.id,
      at: instant(ctx),
      act: 'brief.edited',
      byId: actor.person.id,
      seat: 'originator',
      caseId: file.row.id,
      subject: `cases/${number}`,
      body: { changes: changesBetween(file.row.brief, brief) },
      hides: false,
    });
    return ok({ number, version: file.row.version + 1, brief });
  });
}
