/* What has moved since it was stored: every stored evaluation worked again by this engine, and what differs listed by owner. */
import { setImmediate } from 'node:timers/promises';
import { type Basis } from '@domain/basis';
import { movedResults, type MovedResult } from '@domain/difference';
import { type Evaluation } from '@domain/evaluate';
import { groupLabel, sheetLabel } from '@domain/projections';
import { fail, ok, type Result } from '@domain/result';
import { numberOf, type SiteRules } from '@domain/rules';
import { formatQuantity, type Q } from '@engine/quantity';
import { listDocuments, type DocumentRow } from '@data/documents';
import { findEvaluation } from '@data/evaluations';
import { findPeople } from '@data/people';
import { revisionsOf, type RevisionRow } from '@data/revisions';
import { findRules, type SiteRow } from '@data/site';
import { untilNextWrite } from '@data/memo';
import { rulesOf } from './case-file';
import { type Actor, type Ctx } from './context';
import { evaluateRevision } from './evaluate-document';
import { hiddenOf } from './hidden-view';
import { movedRegisters, type MovedLine, shiftWords } from './moved-registers';

/** A revision whose results moved. `stored`: the bound evaluation, or the registers where none was bound. */
export type MovedRevision = {
  tag: string;
  name: string;
  owner: string;
  revision: string;
  stored: 'evaluation' | 'registers';
  lines: MovedLine[];
};

/** All that moved at a site, by owner; how many revisions were worked again, and how many had nothing stored to compare. */
export type MovedView = { share: number; worked: number; without: number; revisions: MovedRevision[] };

const NOBODY = 'No owner';
const VERDICT = /#verdict$/;
const STATES = ['in-force', 'approved', 'working'];

/** The words of a place in the flat figures: sheet, group or relief point, and what of it. */
function placeWords(doc: Basis, path: string): string {
  const [place = '', of = 'verdict'] = path.split('#');
  const [list, ...rest] = place.split('/');
  const id = rest.join('/');
  const group = doc.groups.find((one) => one.id === id);
  const point = doc.reliefPoints.find((one) => one.id === id);
  const name = list === 'sheets' ? sheetLabel(doc, id) : group ? groupLabel(doc, group) : (point?.tag ?? id);
  return `${name}, ${of.replaceAll('_', ' ')}`;
}

const words = (value: Q | string | undefined): string =>
  value === undefined ? 'no result' : typeof value === 'string' ? value : formatQuantity(value);

function lineOf(doc: Basis, one: MovedResult): MovedLine {
  const verdict = VERDICT.test(one.path);
  return {
    ...{ what: placeWords(doc, one.path), old: words(one.old), now: words(one.now), verdict },
    shift: shiftWords(one.shift),
  };
}

/** Figures alone are stored; verdicts stand among them. */
function ofFigures(figures: unknown): Evaluation {
  const none = { key: '', engine: '', methods: [], sheets: {}, groups: {}, points: {} };
  return { ...none, figures: (figures ?? {}) as Evaluation['figures'] };
}

/** The rules by which the revision was worked, so that nothing but the engine differs. */
async function rulesFor(ctx: Ctx, revision: RevisionRow, present: SiteRules): Promise<SiteRules> {
  const row = revision.rulesId === null ? undefined : await findRules(ctx.db, revision.rulesId);
  return row ? (row.body as SiteRules) : present;
}

type Compared = { stored: MovedRevision['stored']; lines: MovedLine[] } | undefined;

async function compared(
  ctx: Ctx,
  document: DocumentRow,
  revision: RevisionRow,
  rules: SiteRules,
): Promise<Compared> {
  const again = await evaluateRevision(ctx.db, revision, await rulesFor(ctx, revision, rules));
  if (!again) return undefined;
  const share = numberOf(rules, 'engineShift');
  const kept =
    revision.evaluationKey === null ? undefined : await findEvaluation(ctx.db, revision.evaluationKey);
  if (!kept) {
    const lines = await movedRegisters(ctx.db, document, revision, again, share);
    return lines && { stored: 'registers', lines };
  }
  const moved = movedResults(ofFigures(kept.figures), ofFigures(again.evaluation.figures), share);
  const told = moved.filter(
    ({ path, shift, old, now }) =>
      shift !== undefined || VERDICT.test(path) || old === undefined || now === undefined,
  );
  return { stored: 'evaluation', lines: told.map((one) => lineOf(again.body, one)) };
}

const revisionWords = ({ number, state }: RevisionRow): string =>
  number === null ? `working revision` : `revision ${String(number)}, ${state.replaceAll('-', ' ')}`;

/**
 * Works every stored evaluation of a site's systems again (revisions in force, approved and working) and lists what moved by
 * more than the site's share or changed its verdict.
 * @param each is told of every revision that was worked
 */
export async function workMoved(
  ctx: Ctx,
  site: Pick<SiteRow, 'id'>,
  options: { hidden?: ReadonlySet<string>; each?: (done: number) => void } = {},
): Promise<MovedView> {
  const { rules } = await rulesOf(ctx.db, site.id);
  const documents = (await listDocuments(ctx.db, site.id, 'system')).filter(
    (one) => !options.hidden?.has(one.id),
  );
  const owners = new Map(
    (await findPeople(ctx.db, [...new Set(documents.flatMap((one) => one.ownerId ?? []))])).map((one) => [
      one.id,
      one.name,
    ]),
  );
  const view: MovedView = { share: numberOf(rules, 'engineShift'), worked: 0, without: 0, revisions: [] };
  for (const document of documents) {
    for (const revision of (await revisionsOf(ctx.db, document.id)).filter((one) =>
      STATES.includes(one.state),
    )) {
      await setImmediate();
      const found = await compared(ctx, document, revision, rules);
      if (!found) {
        view.without += 1;
        continue;
      }
      view.worked += 1;
      options.each?.(view.worked);
      if (found.lines.length === 0) continue;
      const owner = owners.get(document.ownerId ?? '') ?? NOBODY;
      view.revisions.push({
        tag: document.tag,
        name: document.name,
        owner,
        revision: revisionWords(revision),
        ...found,
      });
    }
  }
  view.revisions.sort((a, b) => a.owner.localeCompare(b.owner) || a.tag.localeCompare(b.tag));
  return view;
}

/** What moved at the site, for its coordinators and auditors; nothing of documents whose results are hidden from them. */
export async function movedView(ctx: Ctx, actor: Actor): Promise<Result<MovedView>> {
  if (!actor.roles.some((role) => role === 'coordinator' || role === 'auditor'))
    return fail('NOT_PERMITTED', 'What moved is listed for site coordinators and auditors.');
  const { documents } = await hiddenOf(ctx, actor);
  const key = ['moved-results', actor.site.id, ...[...documents].sort()];
  return ok(await untilNextWrite(ctx.db, key, () => workMoved(ctx, actor.site, { hidden: documents })));
}
